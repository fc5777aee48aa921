'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { z } from 'zod'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { Select } from '@/components/ui/select'
import { TextInput } from '@/components/ui/text-input'
import { showRefusal } from '@/lib/client/form-refusal'
import { useLendRole } from '@/lib/client/members'
import type { Role } from '@/lib/contracts/common'
import { roleWords } from '@/lib/contracts/common'
import type { MemberView } from '@/lib/contracts/member'
import { lendRoleSchema, longestLoanDays } from '@/lib/contracts/member'

/** The form's time is what the reader's own clock will show; the route takes the moment itself. */
const formSchema = z.object({
  personId: z.string().min(1, 'choose who stands in').pipe(lendRoleSchema.shape.personId),
  role: z.string().min(1, 'choose a role').pipe(lendRoleSchema.shape.role),
  untilAt: z
    .string()
    .min(1, 'choose when it ends')
    .transform((wall) => new Date(wall).toISOString())
    .pipe(lendRoleSchema.shape.untilAt),
})

function wallTime(at: Date): string {
  const two = (value: number) => String(value).padStart(2, '0')
  return `${at.getFullYear()}-${two(at.getMonth() + 1)}-${two(at.getDate())}T${two(at.getHours())}:${two(at.getMinutes())}`
}

function inHours(hours: number): string {
  return wallTime(new Date(Date.now() + hours * 3_600_000))
}

function tomorrowAtSix(): string {
  const at = new Date()
  at.setDate(at.getDate() + 1)
  at.setHours(6, 0, 0, 0)
  return wallTime(at)
}

const quickEnds = [
  { label: 'For 4 hours', at: () => inHours(4) },
  { label: 'Until tomorrow 06:00', at: tomorrowAtSix },
  { label: 'For a week', at: () => inHours(7 * 24) },
]

export interface LendFormProps {
  partyId: string
  members: readonly MemberView[]
  mayLend: readonly Role[]
  onDone: () => void
}

export function LendForm({ partyId, members, mayLend, onDone }: LendFormProps) {
  const [id] = useState(() => crypto.randomUUID())
  const lend = useLendRole(partyId)
  const form = useForm({
    resolver: zodResolver(formSchema),
    defaultValues: { personId: '', role: mayLend.length === 1 ? (mayLend[0] ?? '') : '', untilAt: '' },
  })
  const { errors } = form.formState

  const submit = form.handleSubmit(async (input) => {
    try {
      await lend.mutateAsync({ id, ...input })
      onDone()
    } catch (error) {
      showRefusal(form, error)
    }
  })

  return (
    <form noValidate onSubmit={submit} aria-label="Lend a role" className="mt-4 border border-ink bg-sheet p-4">
      <p className="mb-3 text-soft">
        A stand-in holds the role at once and loses it by itself. Use it when somebody must act in your place tonight.
      </p>
      {errors.root && (
        <Notice kind="error" className="mb-3">
          {errors.root.message}
        </Notice>
      )}
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Who stands in" error={errors.personId?.message}>
          {(control) => (
            <Select
              {...control}
              {...form.register('personId')}
              placeholder="Choose a member"
              options={members.map((member) => ({ value: member.personId, label: member.name }))}
            />
          )}
        </Field>
        <Field label="Role" error={errors.role?.message}>
          {(control) => (
            <Select
              {...control}
              {...form.register('role')}
              placeholder="Choose a role"
              options={mayLend.map((role) => ({ value: role, label: roleWords[role] }))}
            />
          )}
        </Field>
        <Field
          label="Until"
          hint={`In your time zone, ${Intl.DateTimeFormat().resolvedOptions().timeZone}. At most ${longestLoanDays} days.`}
          error={errors.untilAt?.message}
        >
          {(control) => <TextInput {...control} {...form.register('untilAt')} type="datetime-local" className="figures" />}
        </Field>
      </div>
      <div className="mt-2 flex flex-wrap gap-2">
        {quickEnds.map((end) => (
          <Button key={end.label} kind="quiet" onClick={() => form.setValue('untilAt', end.at(), { shouldValidate: true })}>
            {end.label}
          </Button>
        ))}
      </div>
      <div className="mt-4 flex flex-wrap gap-3">
        <Button type="submit" kind="primary" busy={lend.isPending ? 'Lending' : null}>
          Lend this role
        </Button>
        <Button kind="quiet" onClick={onDone}>
          Lend nothing
        </Button>
      </div>
    </form>
  )
}
