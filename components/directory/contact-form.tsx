'use client'

import { useRouter } from 'next/navigation'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { TickSetField } from '@/components/form/tick-set-field'
import { contacts } from '@/lib/client/directory'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { Contact, ContactInput } from '@/lib/contracts/directory'
import { contactDuties, contactInputSchema, contactSchema } from '@/lib/contracts/directory'

const blank: ContactInput = { name: '', email: '', phone: '', duties: ['backline'] }
const names = { name: 'Name', email: 'E-mail', phone: 'Phone', duties: 'Duties' }
const dutyOptions = contactDuties.map((value) => ({ value, label: value }))

function fieldsOf({ name, email, phone, duties }: Contact): ContactInput {
  return { name, email, phone, duties }
}

export interface ContactFormProps {
  /** The venue or the supplier that the contact belongs to, as its place in the API. */
  under: string
  contact: Contact | null
  onClose: () => void
}

/** Somebody at a venue or a supplier, by duty. */
export function ContactForm({ under, contact, onClose }: ContactFormProps) {
  const router = useRouter()
  const saving = useSavingForm<ContactInput, Contact>({
    schema: contactInputSchema,
    start: contact ? fieldsOf(contact) : blank,
    version: contact?.version ?? null,
    key: 'contact',
    save: ({ id, version, fields }) =>
      contact ? contacts.change(contact.id, version, fields) : contacts.create(`${under}/contacts`, id, fields),
    readCurrent: (current) => {
      const row = contactSchema.safeParse(current).data
      return row ? { version: row.version, fields: fieldsOf(row) } : null
    },
    onSaved: () => {
      onClose()
      router.refresh()
    },
  })
  const { form } = saving
  return (
    <SaveForm
      saving={saving}
      label={contact ? contact.name : 'New contact'}
      action={contact ? 'Save the contact' : 'Add this contact'}
      busy="Saving the contact"
      names={names}
      onClose={onClose}
    >
      <div className="grid gap-4 sm:grid-cols-3">
        <TextField form={form} name="name" label="Name" />
        <TextField form={form} name="email" label="E-mail" type="email" />
        <TextField form={form} name="phone" label="Phone" type="tel" optional />
      </div>
      <TickSetField
        form={form}
        name="duties"
        legend="Duties: packs are offered to whoever has backline"
        options={dutyOptions}
      />
    </SaveForm>
  )
}
