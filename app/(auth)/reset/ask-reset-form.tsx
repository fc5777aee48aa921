'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { TextInput } from '@/components/ui/text-input'
import { showRefusal } from '@/lib/client/form-refusal'
import { askForReset } from '@/lib/client/sign-in'
import { askResetSchema } from '@/lib/contracts/sign-in'

export function AskResetForm() {
  const form = useForm({ resolver: zodResolver(askResetSchema), defaultValues: { email: '' } })
  const { errors, isSubmitting, isSubmitSuccessful } = form.formState

  const submit = form.handleSubmit(async (input) => {
    try {
      await askForReset(input)
    } catch (error) {
      showRefusal(form, error)
    }
  })

  if (isSubmitSuccessful && !errors.root && !errors.email) {
    return (
      <Notice kind="success" word="Look in your mail.">
        If we know {form.getValues('email')}, a link is on its way to it. It works once, for an hour.
      </Notice>
    )
  }
  return (
    <form method="post" noValidate onSubmit={submit} className="flex flex-col gap-4">
      {errors.root && <Notice kind="error">{errors.root.message}</Notice>}
      <Field label="E-mail" error={errors.email?.message}>
        {(control) => <TextInput {...control} {...form.register('email')} type="email" autoComplete="email" />}
      </Field>
      <div>
        <Button type="submit" kind="primary" busy={isSubmitting ? 'Sending' : null}>
          Mail me a link
        </Button>
      </div>
    </form>
  )
}
