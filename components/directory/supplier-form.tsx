'use client'

import type { Route } from 'next'
import { useRouter } from 'next/navigation'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { ZoneField } from '@/components/form/zone-field'
import { suppliers } from '@/lib/client/directory'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { Supplier, SupplierInput } from '@/lib/contracts/directory'
import { supplierInputSchema, supplierSchema } from '@/lib/contracts/directory'

const blank: SupplierInput = { name: '', town: '', country: '', zone: null, currency: null, remark: '' }
const names = {
  name: 'Name',
  town: 'Town',
  country: 'Country',
  zone: 'Time zone',
  currency: 'Currency',
  remark: 'Remark',
}

function fieldsOf({ name, town, country, zone, currency, remark }: Supplier): SupplierInput {
  return { name, town, country, zone, currency, remark }
}

/** A supplier, new or as it stands. A new one is opened when it is saved: its contacts come next. */
export function SupplierForm({ supplier, onClose }: { supplier: Supplier | null; onClose: () => void }) {
  const router = useRouter()
  const saving = useSavingForm<SupplierInput, Supplier>({
    schema: supplierInputSchema,
    start: supplier ? fieldsOf(supplier) : blank,
    version: supplier?.version ?? null,
    key: 'supplier',
    save: ({ id, version, fields }) =>
      supplier ? suppliers.change(supplier.id, version, fields) : suppliers.create('/api/suppliers', id, fields),
    readCurrent: (current) => {
      const row = supplierSchema.safeParse(current).data
      return row ? { version: row.version, fields: fieldsOf(row) } : null
    },
    onSaved: (row) => {
      onClose()
      if (supplier) router.refresh()
      else router.push(`/directory/suppliers/${row.id}` as Route)
    },
  })
  const { form } = saving
  return (
    <SaveForm
      saving={saving}
      label={supplier ? supplier.name : 'New supplier'}
      action={supplier ? 'Save the supplier' : 'Add this supplier'}
      busy="Saving the supplier"
      names={names}
      onClose={onClose}
    >
      <TextField form={form} name="name" label="Name" />
      <div className="grid gap-4 sm:grid-cols-3">
        <TextField form={form} name="town" label="Town" optional />
        <TextField form={form} name="country" label="Country" optional />
        <TextField form={form} name="currency" label="Currency" optional emptyIsNull hint="Such as EUR" />
      </div>
      <ZoneField form={form} name="zone" hint="Delivery and collection are told in it." />
      <TextField form={form} name="remark" label="Remark" optional lines={3} />
    </SaveForm>
  )
}
