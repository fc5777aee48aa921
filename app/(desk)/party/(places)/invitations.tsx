'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useState } from 'react'
import { Controller, useForm } from 'react-hook-form'
import { LocalTime } from '@/components/desk/local-time'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { TextInput } from '@/components/ui/text-input'
import { showToast } from '@/components/ui/toast'
import { showRefusal } from '@/lib/client/form-refusal'
import { useInvitations, useInvite, useSendInvitationAgain, useWithdrawInvitation } from '@/lib/client/members'
import type { Role } from '@/lib/contracts/common'
import { roleWords } from '@/lib/contracts/common'
import type { InvitationView } from '@/lib/contracts/member'
import { inviteSchema } from '@/lib/contracts/member'
import { RoleBoxes } from './role-boxes'

export function Invitations({ partyId, initial }: { partyId: string; initial: InvitationView[] }) {
  const { data } = useInvitations(partyId, initial)
  return (
    <section aria-labelledby="invitations-title" className="mt-12">
      <h2 id="invitations-title" className="text-2xl">
        Invite somebody
      </h2>
      <InviteForm partyId={partyId} />
      {data.length > 0 && (
        <>
          <h3 className="mt-8 text-xl">Invited, not joined yet</h3>
          <ul className="mt-2 border-t-2 border-ink">
            {data.map((invitation) => (
              <OpenInvitation key={invitation.id} partyId={partyId} invitation={invitation} />
            ))}
          </ul>
        </>
      )}
    </section>
  )
}

function InviteForm({ partyId }: { partyId: string }) {
  const [id, setId] = useState(() => crypto.randomUUID())
  const invite = useInvite(partyId)
  const nobody: { email: string; roles: Role[] } = { email: '', roles: [] }
  const form = useForm({ resolver: zodResolver(inviteSchema), defaultValues: nobody })
  const { errors } = form.formState

  const submit = form.handleSubmit(async (input) => {
    try {
      const made = await invite.mutateAsync({ ...input, id })
      form.reset(nobody)
      setId(crypto.randomUUID())
      showToast(`An invitation is on its way to ${made.email}.`)
    } catch (error) {
      showRefusal(form, error)
    }
  })

  return (
    <form noValidate onSubmit={submit} aria-label="Invite somebody" className="mt-3 flex max-w-2xl flex-col gap-4">
      {errors.root && <Notice kind="error">{errors.root.message}</Notice>}
      <Field label="E-mail" error={errors.email?.message}>
        {(control) => <TextInput {...control} {...form.register('email')} type="email" autoComplete="off" />}
      </Field>
      <Controller
        control={form.control}
        name="roles"
        render={({ field }) => (
          <RoleBoxes
            legend="Roles"
            idPrefix="invite"
            value={field.value}
            onChange={field.onChange}
            error={errors.roles?.message ?? errors.roles?.root?.message}
          />
        )}
      />
      <div>
        <Button type="submit" kind="primary" busy={invite.isPending ? 'Sending' : null}>
          Send the invitation
        </Button>
      </div>
    </form>
  )
}

function OpenInvitation({ partyId, invitation }: { partyId: string; invitation: InvitationView }) {
  const again = useSendInvitationAgain(partyId)
  const withdraw = useWithdrawInvitation(partyId)
  const refusal = again.error ?? withdraw.error
  return (
    <li className="border-b border-line py-3">
      <div className="flex flex-wrap items-start gap-x-6 gap-y-1">
        <div className="min-w-0 grow basis-72">
          <p className="font-bold wrap-anywhere">{invitation.email}</p>
          <p className="text-sm text-soft">
            {invitation.roles.map((role) => roleWords[role]).join(', ')}, invited by {invitation.invitedBy}
          </p>
          <p className="text-sm">
            {invitation.expired ? (
              <strong className="text-spike-text">Run out</strong>
            ) : (
              <span className="text-soft">Open until</span>
            )}{' '}
            <LocalTime iso={invitation.expiresAt} />
          </p>
        </div>
        <div className="-ml-4 flex flex-wrap sm:ml-0">
          <Button
            kind="quiet"
            busy={again.isPending ? 'Sending' : null}
            onClick={() =>
              again.mutate(invitation.id, {
                onSuccess: () => showToast(`The invitation is on its way to ${invitation.email} again.`),
              })
            }
          >
            Send again<span className="sr-only"> to {invitation.email}</span>
          </Button>
          <Button
            kind="quiet"
            busy={withdraw.isPending ? 'Withdrawing' : null}
            onClick={() => withdraw.mutate(invitation.id)}
          >
            Withdraw<span className="sr-only"> the invitation to {invitation.email}</span>
          </Button>
        </div>
      </div>
      {refusal && <Notice kind="error">{refusal.message}</Notice>}
    </li>
  )
}
