'use client'

import { OpenedForm } from '@/components/form/opened-form'
import type { Tour } from '@/lib/contracts/tour'
import { TourForm } from './tour-form'

/** The tour's name, and the way to change it. */
export function TourHeading({ tour, mayEdit }: { tour: Tour; mayEdit: boolean }) {
  return (
    <div className="flex flex-wrap items-baseline gap-x-4">
      <h1 className="text-4xl">{tour.name}</h1>
      {mayEdit && (
        <OpenedForm action="Change the name" kind="quiet">
          {(close) => <TourForm tour={tour} onClose={close} />}
        </OpenedForm>
      )}
    </div>
  )
}
