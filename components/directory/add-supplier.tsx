'use client'

import { OpenedForm } from '@/components/form/opened-form'
import { SupplierForm } from './supplier-form'

export function AddSupplier({ first }: { first: boolean }) {
  return (
    <OpenedForm action={first ? 'Add the first supplier' : 'Add a supplier'} kind={first ? 'primary' : 'secondary'}>
      {(close) => <SupplierForm supplier={null} onClose={close} />}
    </OpenedForm>
  )
}
