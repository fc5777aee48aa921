'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { TextInput } from '@/components/ui/text-input'
import { changePassword } from '@/lib/client/account'
import { showRefusal } from '@/lib/client/form-refusal'
import { changePasswordSchema } from '@/lib/contracts/sign-in'

export function PasswordForm({ known }: { known: boolean }) {
  const router = useRouter()
  const [saved, setSaved] = useState(false)
  const blank = { current: known ? '' : null, password: '' }
  const form = useForm({ resolver: zodResolver(changePasswordSchema), defaultValues: blank })
  const { errors, isSubmitting } = form.formState

  const submit = form.handleSubmit(async (input) => {
    setSaved(false)
    try {
      await changePassword(input)
      form.reset({ current: '', password: '' })
      setSaved(true)
      router.refresh()
    } catch (error) {
      showRefusal(form, error)
    }
  })

  return (
    <form method="post" noValidate onSubmit={submit} className="flex max-w-md flex-col gap-4">
      {errors.root && <Notice kind="error">{errors.root.message}</Notice>}
      {saved && <Notice kind="success">Your new password is set. Every other device is signed out.</Notice>}
      {known && (
        <Field label="Password you have now" error={errors.current?.message}>
          {(control) => (
            <TextInput {...control} {...form.register('current')} type="password" autoComplete="current-password" />
          )}
        </Field>
      )}
      <Field label="New password" hint="At least 10 characters. A few words you can remember are better than signs." error={errors.password?.message}>
        {(control) => (
          <TextInput {...control} {...form.register('password')} type="password" autoComplete="new-password" />
        )}
      </Field>
      <div>
        <Button type="submit" kind="primary" busy={isSubmitting ? 'Saving' : null}>
          Save the new password
        </Button>
      </div>
    </form>
  )
}
