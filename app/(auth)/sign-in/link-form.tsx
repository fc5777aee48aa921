'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useRouter } from 'next/navigation'
import { useForm } from 'react-hook-form'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { TextInput } from '@/components/ui/text-input'
import { showRefusal } from '@/lib/client/form-refusal'
import { askForSignInLink } from '@/lib/client/sign-in'
import { signInLinkSchema } from '@/lib/contracts/sign-in'
import { signInError } from './sign-in-words'

export function LinkForm({ next }: { next: string }) {
  const router = useRouter()
  const form = useForm({ resolver: zodResolver(signInLinkSchema), defaultValues: { email: '' } })
  const { errors, isSubmitting } = form.formState

  const submit = form.handleSubmit(async (input) => {
    try {
      const code = await askForSignInLink({ ...input, next })
      if (code) return form.setError('root', { message: signInError(code) })
      router.push('/sign-in/sent')
    } catch (error) {
      showRefusal(form, error)
    }
  })

  return (
    <form method="post" noValidate onSubmit={submit} className="flex flex-col gap-4" aria-label="Sign in by a mailed link">
      {errors.root && <Notice kind="error">{errors.root.message}</Notice>}
      <Field label="Mail address for the link" error={errors.email?.message}>
        {(control) => (
          <TextInput {...control} {...form.register('email')} type="email" autoComplete="email" />
        )}
      </Field>
      <div>
        <Button type="submit" busy={isSubmitting ? 'Sending' : null}>
          Mail me a link
        </Button>
      </div>
    </form>
  )
}
