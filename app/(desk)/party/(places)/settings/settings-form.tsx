'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { NumberInput } from '@/components/ui/number-input'
import { Select } from '@/components/ui/select'
import { TextInput } from '@/components/ui/text-input'
import { showToast } from '@/components/ui/toast'
import { showRefusal } from '@/lib/client/form-refusal'
import { useChangeParty } from '@/lib/client/party'
import type { Party } from '@/lib/contracts/party'
import { locales, localeWords, paperSizes, partySchema, partySettingsSchema, unitSystems, unitWords } from '@/lib/contracts/party'
import { AppError } from '@/lib/errors'

const asNumber = (typed: unknown) => Number(String(typed).trim().replace(',', '.'))

/** The values stand in the page as it is sent, not only once it has woken up. */
export function SettingsForm({ party, readOnly }: { party: Party; readOnly: boolean }) {
  const router = useRouter()
  const change = useChangeParty()
  const [version, setVersion] = useState(party.version)
  const [theirs, setTheirs] = useState<Party | null>(null)
  const form = useForm({ resolver: zodResolver(partySettingsSchema), defaultValues: party, disabled: readOnly })
  const { errors } = form.formState

  const submit = form.handleSubmit(async (settings) => {
    try {
      const saved = await change.mutateAsync({ ...settings, version })
      setVersion(saved.version)
      setTheirs(null)
      form.reset(saved)
      showToast('The settings are saved.')
      router.refresh()
    } catch (error) {
      const current = error instanceof AppError && error.code === 'stale' ? partySchema.safeParse(error.details?.['current']) : null
      if (current?.success) {
        setVersion(current.data.version)
        setTheirs(current.data)
      }
      showRefusal(form, error)
    }
  })

  return (
    <form noValidate onSubmit={submit} className="flex max-w-xl flex-col gap-4">
      {errors.root && (
        <Notice
          kind="error"
          action={
            theirs && (
              <Button
                onClick={() => {
                  form.reset(theirs)
                  setTheirs(null)
                }}
              >
                Take theirs
              </Button>
            )
          }
        >
          {errors.root.message}
          {theirs && ` Theirs: ${theirs.name}, ${unitWords[theirs.units]}, A4 ${theirs.referenceHz} Hz, ${theirs.paper}, ${localeWords[theirs.locale]}.`}
        </Notice>
      )}
      <Field label="Name of the party" hint="Venues and suppliers read it on every page and mail." error={errors.name?.message}>
        {(control) => <TextInput {...control} {...form.register('name')} defaultValue={party.name} autoComplete="off" />}
      </Field>
      <Field label="Lengths and places" hint="Drum sizes stay in inches, as the trade writes them." error={errors.units?.message}>
        {(control) => (
          <Select
            {...control}
            {...form.register('units')} defaultValue={party.units}
            options={unitSystems.map((units) => ({ value: units, label: unitWords[units] }))}
          />
        )}
      </Field>
      <Field label="Reference pitch, A4" hint="415 to 466 Hz. Every note's frequency follows from it." error={errors.referenceHz?.message}>
        {(control) => (
          <NumberInput {...control} unit="Hz" className="max-w-40" {...form.register('referenceHz', { setValueAs: asNumber })} defaultValue={party.referenceHz} />
        )}
      </Field>
      <Field label="Names of the notes" error={errors.locale?.message}>
        {(control) => (
          <Select
            {...control}
            {...form.register('locale')} defaultValue={party.locale}
            options={locales.map((locale) => ({ value: locale, label: localeWords[locale] }))}
          />
        )}
      </Field>
      <Field label="Paper" error={errors.paper?.message}>
        {(control) => (
          <Select {...control} {...form.register('paper')} defaultValue={party.paper} options={paperSizes.map((paper) => ({ value: paper, label: paper }))} />
        )}
      </Field>
      {!readOnly && (
        <div>
          <Button type="submit" kind="primary" busy={change.isPending ? 'Saving' : null}>
            Save the settings
          </Button>
        </div>
      )}
    </form>
  )
}
