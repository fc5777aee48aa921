'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import Link from 'next/link'
import { useForm } from 'react-hook-form'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { TextInput } from '@/components/ui/text-input'
import { showRefusal } from '@/lib/client/form-refusal'
import { loadPage } from '@/lib/client/load-page'
import { signInWithPassword } from '@/lib/client/sign-in'
import { signInSchema } from '@/lib/contracts/sign-in'
import { signInError } from './sign-in-words'

export function PasswordForm({ next }: { next: string }) {
  const form = useForm({ resolver: zodResolver(signInSchema), defaultValues: { email: '', password: '' } })
  const { errors, isSubmitting, isSubmitSuccessful } = form.formState

  const submit = form.handleSubmit(async (input) => {
    try {
      const code = await signInWithPassword(input)
      if (code) return form.setError('root', { message: signInError(code) })
      loadPage(next)
    } catch (error) {
      showRefusal(form, error)
    }
  })

  return (
    <form method="post" noValidate onSubmit={submit} className="flex flex-col gap-4">
      {errors.root && <Notice kind="error">{errors.root.message}</Notice>}
      <Field label="E-mail" error={errors.email?.message}>
        {(control) => (
          <TextInput {...control} {...form.register('email')} type="email" autoComplete="username" />
        )}
      </Field>
      <Field label="Password" error={errors.password?.message}>
        {(control) => (
          <TextInput {...control} {...form.register('password')} type="password" autoComplete="current-password" />
        )}
      </Field>
      <div className="flex flex-wrap items-center justify-between gap-3">
        <Button type="submit" kind="primary" busy={isSubmitting || (isSubmitSuccessful && !errors.root) ? 'Signing in' : null}>
          Sign in
        </Button>
        <Link href="/reset" className="flex min-h-control items-center underline underline-offset-4">
          Choose a new password
        </Link>
      </div>
    </form>
  )
}
