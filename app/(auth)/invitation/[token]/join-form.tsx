'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { z } from 'zod'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { TextInput } from '@/components/ui/text-input'
import { showRefusal } from '@/lib/client/form-refusal'
import { loadPage } from '@/lib/client/load-page'
import { acceptInvitation, signInWithPassword } from '@/lib/client/sign-in'
import { nameSchema } from '@/lib/contracts/common'
import { newPasswordSchema } from '@/lib/contracts/sign-in'

const newcomerSchema = z.object({ name: nameSchema, password: newPasswordSchema })

/** For somebody new: the account and the place in the party are made in one step. */
export function JoinForm({ token, email, partyName }: { token: string; email: string; partyName: string }) {
  const form = useForm({ resolver: zodResolver(newcomerSchema), defaultValues: { name: '', password: '' } })
  const { errors, isSubmitting } = form.formState

  const submit = form.handleSubmit(async (newcomer) => {
    try {
      await acceptInvitation({ token, newcomer })
      const refused = await signInWithPassword({ email, password: newcomer.password })
      loadPage(refused ? `/sign-in?error=${encodeURIComponent(refused)}` : '/tours')
    } catch (error) {
      showRefusal(form, error)
    }
  })

  return (
    <form method="post" noValidate onSubmit={submit} className="flex flex-col gap-4">
      {errors.root && <Notice kind="error">{errors.root.message}</Notice>}
      <input type="hidden" name="username" autoComplete="username" value={email} readOnly />
      <Field label="Your name" hint="As your crew knows you." error={errors.name?.message}>
        {(control) => <TextInput {...control} {...form.register('name')} autoComplete="name" />}
      </Field>
      <Field label="Choose a password" hint="At least 10 characters. A few words you can remember are better than signs." error={errors.password?.message}>
        {(control) => (
          <TextInput {...control} {...form.register('password')} type="password" autoComplete="new-password" />
        )}
      </Field>
      <div>
        <Button type="submit" kind="primary" busy={isSubmitting ? 'Joining' : null}>
          Join {partyName}
        </Button>
      </div>
    </form>
  )
}
