'use client'

import { OpenedForm } from '@/components/form/opened-form'
import { RemoveButton } from '@/components/form/remove-button'
import { EmptyState } from '@/components/ui/empty-state'
import { contacts as api } from '@/lib/client/directory'
import type { Contact } from '@/lib/contracts/directory'
import { ContactForm } from './contact-form'

export interface ContactsProps {
  /** The venue or the supplier, as its place in the API. */
  under: string
  contacts: readonly Contact[]
  mayEdit: boolean
}

/** The people at a venue or a supplier, by duty. */
export function Contacts({ under, contacts, mayEdit }: ContactsProps) {
  return (
    <>
      {contacts.length === 0 && (
        <div className="mt-3">
          <EmptyState title="Nobody yet">
            {mayEdit
              ? 'Add whoever looks after backline, with an e-mail address: packs are sent there, and the answer comes back by a link.'
              : 'The tour manager adds the people to write to.'}
          </EmptyState>
        </div>
      )}
      {contacts.length > 0 && (
        <ul className="mt-3 border-t-2 border-ink">
          {contacts.map((contact) => (
            <li key={contact.id} className="border-b border-line py-2">
              <div className="flex flex-wrap items-baseline gap-x-6">
                <h3 className="text-lg">{contact.name}</h3>
                <span>{contact.duties.join(', ')}</span>
                <a className="break-all underline underline-offset-4" href={`mailto:${contact.email}`}>
                  {contact.email}
                </a>
                {contact.phone && (
                  <a
                    className="figures underline underline-offset-4"
                    href={`tel:${contact.phone.replace(/[^+\d]/g, '')}`}
                  >
                    {contact.phone}
                  </a>
                )}
              </div>
              {mayEdit && (
                <div className="-ml-4 flex flex-wrap items-center gap-x-2">
                  <OpenedForm action={`Change ${contact.name}`} kind="quiet">
                    {(close) => <ContactForm under={under} contact={contact} onClose={close} />}
                  </OpenedForm>
                  <RemoveButton
                    action={`Take ${contact.name} away`}
                    busy="Taking the contact away"
                    done={`${contact.name} is gone`}
                    remove={() => api.remove(contact.id, contact.version)}
                    undo={{
                      label: `Put ${contact.name} back`,
                      run: () => {
                        const { name, email, phone, duties } = contact
                        return api.create(`${under}/contacts`, contact.id, { name, email, phone, duties })
                      },
                    }}
                  />
                </div>
              )}
            </li>
          ))}
        </ul>
      )}
      {mayEdit && (
        <div className="mt-3">
          <OpenedForm
            action={contacts.length === 0 ? 'Add the first contact' : 'Add a contact'}
            kind={contacts.length === 0 ? 'primary' : 'secondary'}
          >
            {(close) => <ContactForm under={under} contact={null} onClose={close} />}
          </OpenedForm>
        </div>
      )}
    </>
  )
}
