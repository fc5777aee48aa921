'use client'

import { OpenedForm } from '@/components/form/opened-form'
import { VenueForm } from './venue-form'

export function AddVenue({ first }: { first: boolean }) {
  return (
    <OpenedForm action={first ? 'Add the first venue' : 'Add a venue'} kind={first ? 'primary' : 'secondary'}>
      {(close) => <VenueForm venue={null} onClose={close} />}
    </OpenedForm>
  )
}
