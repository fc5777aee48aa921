'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { TextInput } from '@/components/ui/text-input'
import { createParty } from '@/lib/client/account'
import { showRefusal } from '@/lib/client/form-refusal'
import { loadPage } from '@/lib/client/load-page'
import { createPartySchema } from '@/lib/contracts/party'

export function NewPartyForm() {
  // Made once: pressing again after a lost answer is the same request.
  const [id] = useState(() => crypto.randomUUID())
  const form = useForm({ resolver: zodResolver(createPartySchema), defaultValues: { name: '' } })
  const { errors, isSubmitting } = form.formState

  const submit = form.handleSubmit(async ({ name }) => {
    try {
      await createParty({ id, name })
      loadPage('/tours')
    } catch (error) {
      showRefusal(form, error)
    }
  })

  return (
    <form noValidate onSubmit={submit} className="mt-6 flex flex-col gap-4">
      {errors.root && <Notice kind="error">{errors.root.message}</Notice>}
      <Field label="Name of the party" hint="The act, or the crew: what venues will read on every page." error={errors.name?.message}>
        {(control) => <TextInput {...control} {...form.register('name')} autoComplete="off" />}
      </Field>
      <div>
        <Button type="submit" kind="primary" busy={isSubmitting ? 'Making the party' : null}>
          Make this party
        </Button>
      </div>
    </form>
  )
}
