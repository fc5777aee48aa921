'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { TextInput } from '@/components/ui/text-input'
import { showRefusal } from '@/lib/client/form-refusal'
import { loadPage } from '@/lib/client/load-page'
import { redeemReset } from '@/lib/client/sign-in'
import { redeemResetSchema } from '@/lib/contracts/sign-in'

export function NewPasswordForm({ token }: { token: string }) {
  const form = useForm({ resolver: zodResolver(redeemResetSchema), defaultValues: { token, password: '' } })
  const { errors, isSubmitting } = form.formState

  const submit = form.handleSubmit(async (input) => {
    try {
      await redeemReset(input)
      loadPage('/sign-in?said=reset')
    } catch (error) {
      showRefusal(form, error)
    }
  })

  return (
    <form method="post" noValidate onSubmit={submit} className="flex flex-col gap-4">
      {errors.root && <Notice kind="error">{errors.root.message}</Notice>}
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
