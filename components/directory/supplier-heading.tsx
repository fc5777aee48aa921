'use client'

import type { Route } from 'next'
import { useRouter } from 'next/navigation'
import { OpenedForm } from '@/components/form/opened-form'
import { RemoveButton } from '@/components/form/remove-button'
import { suppliers } from '@/lib/client/directory'
import type { Supplier } from '@/lib/contracts/directory'
import { SupplierForm } from './supplier-form'

export interface SupplierHeadingProps {
  supplier: Supplier
  /** Its contacts would go with it, and could not be brought back by one step. */
  isBare: boolean
  mayEdit: boolean
}

/** A supplier's name and place, and the ways to change it. */
export function SupplierHeading({ supplier, isBare, mayEdit }: SupplierHeadingProps) {
  const router = useRouter()
  const { id: _id, version, ...fields } = supplier
  const place = [supplier.town, supplier.country].filter(Boolean).join(', ') || 'town not known yet'
  const zone = supplier.zone ? `${supplier.zone} time` : 'time zone not known yet'
  return (
    <div>
      <h1 className="text-4xl">{supplier.name}</h1>
      <p className="mt-1 text-lg text-soft">
        {place}; {zone}; {supplier.currency ? `prices in ${supplier.currency}` : 'currency not known yet'}
      </p>
      {supplier.remark && <p className="mt-2 max-w-prose whitespace-pre-line">{supplier.remark}</p>}
      {mayEdit && (
        <div className="-ml-4 mt-1 flex flex-wrap items-center gap-x-2">
          <OpenedForm action="Change the supplier" kind="quiet">
            {(close) => <SupplierForm supplier={supplier} onClose={close} />}
          </OpenedForm>
          {isBare && (
            <RemoveButton
              action="Take it out of the directory"
              busy="Taking it out"
              done={`${supplier.name} is out of the directory`}
              remove={() => suppliers.remove(supplier.id, version)}
              undo={{
                label: `Put ${supplier.name} back`,
                run: () => suppliers.create('/api/suppliers', supplier.id, fields),
              }}
              onRemoved={() => router.push('/directory/suppliers' as Route)}
            />
          )}
        </div>
      )}
    </div>
  )
}
