'use client'

import { useRouter } from 'next/navigation'
import { useEffect } from 'react'
import { useWatch } from 'react-hook-form'
import { ChoiceField } from '@/components/form/choice-field'
import { NumberField } from '@/components/form/number-field'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { TickSetField } from '@/components/form/tick-set-field'
import { WallField } from '@/components/form/wall-field'
import { ZoneField } from '@/components/form/zone-field'
import { ButtonLink } from '@/components/ui/button-link'
import { Checkbox } from '@/components/ui/checkbox'
import { EmptyState } from '@/components/ui/empty-state'
import { changeHire, createHire } from '@/lib/client/hires'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { Hire, HireInput } from '@/lib/contracts/hire'
import { hireInputOf, hireInputSchema, hireSchema, rateBases } from '@/lib/contracts/hire'

const names = {
  supplierId: 'Supplier',
  name: 'What it is',
  showIds: 'Shows',
  zone: 'Time zone',
  deliveryDate: 'Delivery',
  deliveryFrom: 'Delivery from',
  deliveryUntil: 'Delivery until',
  collectionDate: 'Collection',
  collectionFrom: 'Collection from',
  collectionUntil: 'Collection until',
  receiver: 'Receiver',
  conditionOnReturn: 'Condition on return',
  poNumber: 'PO number',
  rateBasis: 'Rate by',
  currency: 'Currency',
  transport: 'Transport',
  taxPercent: 'Tax',
  validUntil: 'Quote valid until',
  answersDue: 'Answers due',
  confirmed: 'Confirmed',
}
const rateOptions = rateBases.map((value) => ({ value, label: `by the ${value}` }))

export interface HireChoices {
  shows: readonly { id: string; label: string }[]
  suppliers: readonly { id: string; name: string; currency: string | null }[]
}

export interface HireFormProps {
  tourId: string
  hire: Hire | null
  choices: HireChoices
  onClose: () => void
}

/** A supplier over several shows: one van, answered once. */
export function HireForm(props: HireFormProps) {
  if (props.choices.suppliers.length === 0) {
    return (
      <EmptyState
        title="No supplier in the directory yet"
        action={<ButtonLink href="/directory/suppliers">Add the first supplier</ButtonLink>}
      >
        A hire is asked of a supplier. Add one with a contact first; its answers then arrive line by line.
      </EmptyState>
    )
  }
  return <HireFields {...props} />
}

function HireFields({ tourId, hire, choices, onClose }: HireFormProps) {
  const router = useRouter()
  const saving = useSavingForm<HireInput, Hire>({
    schema: hireInputSchema,
    start: hire ? hireInputOf(hire) : newHire(choices),
    version: hire?.version ?? null,
    key: 'hire',
    save: ({ id, version, fields }) => (hire ? changeHire(hire.id, version, fields) : createHire(tourId, id, fields)),
    readCurrent: (current) => {
      const row = hireSchema.safeParse(current).data
      return row ? { version: row.version, fields: hireInputOf(row) } : null
    },
    onSaved: () => {
      onClose()
      router.refresh()
    },
  })
  const { form } = saving
  const { getValues, setValue } = form
  const supplierId = useWatch({ control: form.control, name: 'supplierId' })
  const usualCurrency = choices.suppliers.find(({ id }) => id === supplierId)?.currency ?? null
  useEffect(() => {
    if (usualCurrency && !getValues('currency')) setValue('currency', usualCurrency)
  }, [usualCurrency, getValues, setValue])
  const supplierOptions = choices.suppliers.map(({ id, name }) => ({ value: id, label: name }))
  const showOptions = choices.shows.map(({ id, label }) => ({ value: id, label }))
  const labelOf = (options: readonly { value: string; label: string }[], value: unknown) =>
    options.find((option) => option.value === value)?.label
  return (
    <SaveForm
      saving={saving}
      label={hire ? `${hire.supplierName} hire` : 'New hire'}
      action={hire ? 'Save the hire' : 'Add this hire'}
      busy="Saving the hire"
      names={names}
      say={(field, value) => {
        if (field === 'supplierId') return labelOf(supplierOptions, value)
        if (field === 'showIds' && Array.isArray(value))
          return value.map((id) => labelOf(showOptions, id) ?? '').join('; ')
        return undefined
      }}
      onClose={onClose}
    >
      <div className="grid gap-4 sm:grid-cols-2">
        <ChoiceField
          form={form}
          name="supplierId"
          label="Supplier"
          options={supplierOptions}
          placeholder="Choose a supplier"
        />
        <TextField form={form} name="name" label="What it is" optional hint="Such as one van, full rig" />
      </div>
      <TickSetField form={form} name="showIds" legend="The shows it covers" options={showOptions} />
      <div className="grid gap-4 sm:grid-cols-3">
        <TextField form={form} name="deliveryDate" label="Delivery day" type="date" optional emptyIsNull />
        <TextField form={form} name="deliveryFrom" label="Delivery from" type="time" optional emptyIsNull />
        <TextField form={form} name="deliveryUntil" label="Delivery until" type="time" optional emptyIsNull />
        <TextField form={form} name="collectionDate" label="Collection day" type="date" optional emptyIsNull />
        <TextField form={form} name="collectionFrom" label="Collection from" type="time" optional emptyIsNull />
        <TextField form={form} name="collectionUntil" label="Collection until" type="time" optional emptyIsNull />
      </div>
      <ZoneField form={form} name="zone" hint="The windows above are told in it. Empty takes the supplier's." />
      <div className="grid gap-4 sm:grid-cols-3">
        <TextField form={form} name="receiver" label="Receiver on site" optional />
        <TextField form={form} name="conditionOnReturn" label="Condition on return" optional />
        <TextField form={form} name="poNumber" label="PO number" optional />
      </div>
      <div className="grid gap-4 sm:grid-cols-4">
        <ChoiceField form={form} name="rateBasis" label="Rate" options={rateOptions} />
        <TextField form={form} name="currency" label="Currency" optional emptyIsNull hint="Such as EUR" />
        <TextField form={form} name="transport" label="Transport" optional hint="Such as 1250.50" />
        <NumberField form={form} name="taxPercent" label="Tax" unit="%" optional />
      </div>
      <div className="grid gap-4 sm:grid-cols-2">
        <WallField form={form} name="answersDue" label="Answers due" />
        <TextField form={form} name="validUntil" label="Quote valid until" type="date" optional emptyIsNull />
      </div>
      <Checkbox label="Confirmed with the supplier" {...form.register('confirmed')} />
    </SaveForm>
  )
}

function newHire(choices: HireChoices): HireInput {
  return {
    supplierId: '',
    name: '',
    showIds: choices.shows.length === 1 ? choices.shows.map((show) => show.id) : [],
    zone: null,
    deliveryDate: null,
    deliveryFrom: null,
    deliveryUntil: null,
    collectionDate: null,
    collectionFrom: null,
    collectionUntil: null,
    receiver: '',
    conditionOnReturn: '',
    poNumber: '',
    rateBasis: 'show',
    currency: null,
    transport: '',
    taxPercent: null,
    validUntil: null,
    answersDue: null,
    confirmed: false,
  }
}
