'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { TextInput } from '@/components/ui/text-input'
import { showRefusal } from '@/lib/client/form-refusal'
import { signUp } from '@/lib/client/sign-in'
import { signUpSchema } from '@/lib/contracts/sign-in'

export function SignUpForm({ next }: { next: string | undefined }) {
  const form = useForm({ resolver: zodResolver(signUpSchema), defaultValues: { name: '', email: '', next } })
  const { errors, isSubmitting, isSubmitSuccessful } = form.formState

  const submit = form.handleSubmit(async (input) => {
    try {
      await signUp(input)
    } catch (error) {
      showRefusal(form, error)
    }
  })

  if (isSubmitSuccessful && !errors.root && !errors.email && !errors.name) {
    return (
      <Notice kind="success" word="Look in your mail.">
        A link is on its way to {form.getValues('email')}. It works once, for 20 minutes.
      </Notice>
    )
  }
  return (
    <form method="post" noValidate onSubmit={submit} className="flex flex-col gap-4">
      {errors.root && <Notice kind="error">{errors.root.message}</Notice>}
      <Field label="Your name" hint="As your crew knows you." error={errors.name?.message}>
        {(control) => <TextInput {...control} {...form.register('name')} autoComplete="name" />}
      </Field>
      <Field label="E-mail" error={errors.email?.message}>
        {(control) => <TextInput {...control} {...form.register('email')} type="email" autoComplete="email" />}
      </Field>
      <div>
        <Button type="submit" kind="primary" busy={isSubmitting ? 'Sending' : null}>
          Mail me a link to begin
        </Button>
      </div>
    </form>
  )
}
