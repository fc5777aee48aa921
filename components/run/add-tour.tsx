'use client'

import { OpenedForm } from '@/components/form/opened-form'
import { NewTourForm } from './new-tour-form'

/** The form of a new tour: open at once where there is none yet, else behind its button. */
export function AddTour({ asksPlayer, open }: { asksPlayer: boolean; open: boolean }) {
  if (open) return <NewTourForm asksPlayer={asksPlayer} onClose={null} />
  return (
    <OpenedForm action="Make another tour">
      {(close) => <NewTourForm asksPlayer={asksPlayer} onClose={close} />}
    </OpenedForm>
  )
}
