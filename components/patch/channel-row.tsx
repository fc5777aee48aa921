'use client'

import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { FieldError } from '@/components/ui/field'
import { NumberInput } from '@/components/ui/number-input'
import { Select } from '@/components/ui/select'
import { TableCell, TableRow } from '@/components/ui/table'
import { TextInput } from '@/components/ui/text-input'
import type { Channel, ChannelInput } from '@/lib/contracts/channel'
import { choiceValue, type OutputChoice } from './output-choices'

export interface ChannelRowProps {
  channel: Channel
  choices: readonly OutputChoice[]
  /** What it takes, in words. */
  taken: string
  isGone: boolean
  mayEdit: boolean
  /** Saves the row; returns what is wrong with it, or null. */
  onChange: (channel: ChannelInput) => Promise<string | null>
  onRemove: () => void
}

/** One channel; each box is saved when it is left or Enter is pressed. */
export function ChannelRow({ channel, choices, taken, isGone, mayEdit, onChange, onRemove }: ChannelRowProps) {
  const [draft, setDraft] = useState<{ number?: string; name?: string; stand?: string }>({})
  const [error, setError] = useState<string | null>(null)
  const { number, name, pieceId, output, stand, phantom } = channel
  const label = `Channel ${number}`

  async function save(changes: Partial<ChannelInput>) {
    const wrong = await onChange({ number, name, pieceId, output, stand, phantom, ...changes })
    setError(wrong)
    if (wrong === null) setDraft({})
  }
  function commit() {
    const typed = draft.number === undefined ? number : Number(draft.number)
    if (!Number.isInteger(typed) || typed < 1 || typed > 512) {
      setError('Write a channel number from 1 to 512')
      return
    }
    const next = { number: typed, name: draft.name?.trim() ?? name, stand: draft.stand?.trim() ?? stand }
    if (next.number === number && next.name === name && next.stand === stand) {
      setDraft({})
      setError(null)
      return
    }
    void save(next)
  }
  const box = (field: 'number' | 'name' | 'stand', value: string) => ({
    value: draft[field] ?? value,
    'aria-label': `${label}, ${field}`,
    onChange: (event: React.ChangeEvent<HTMLInputElement>) =>
      setDraft({ ...draft, [field]: event.currentTarget.value }),
    onBlur: commit,
    onKeyDown: (event: React.KeyboardEvent) => {
      if (event.key === 'Enter') commit()
      if (event.key === 'Escape') {
        setDraft({})
        setError(null)
      }
    },
  })

  if (!mayEdit) {
    return (
      <TableRow>
        <TableCell className="figures w-20">{number}</TableCell>
        <TableCell>{name}</TableCell>
        <TableCell>{isGone ? 'gone from the plot' : taken}</TableCell>
        <TableCell>{stand}</TableCell>
        <TableCell>{phantom ? '48 V' : '–'}</TableCell>
      </TableRow>
    )
  }
  return (
    <TableRow>
      <TableCell className="w-20">
        <NumberInput {...box('number', String(number))} />
      </TableCell>
      <TableCell className="min-w-40">
        <TextInput {...box('name', name)} />
        {error !== null && (
          <div role="alert">
            <FieldError id={`channel-${channel.id}-error`}>{error}</FieldError>
          </div>
        )}
      </TableCell>
      <TableCell className="min-w-52">
        <Select
          aria-label={`${label}, takes`}
          placeholder={isGone ? taken : 'nothing yet'}
          options={choices}
          value={pieceId === null || isGone ? '' : choiceValue(pieceId, output)}
          onChange={(event) => {
            const choice = choices.find((one) => one.value === event.currentTarget.value)
            void save({ pieceId: choice?.pieceId ?? null, output: choice?.output ?? '' })
          }}
        />
        {isGone && (
          <p className="mt-1 border-l-4 border-brass pl-2 text-sm text-brass">
            Gone from the plot: choose another output.
          </p>
        )}
      </TableCell>
      <TableCell className="min-w-28">
        <TextInput {...box('stand', stand)} />
      </TableCell>
      <TableCell>
        <input
          type="checkbox"
          aria-label={`${label}, phantom`}
          className="mt-2 size-5 accent-ink"
          checked={phantom}
          onChange={(event) => void save({ phantom: event.currentTarget.checked })}
        />
      </TableCell>
      <TableCell>
        <Button kind="quiet" className="px-1" aria-label={`Take channel ${number} off the patch`} onClick={onRemove}>
          Take off
        </Button>
      </TableCell>
    </TableRow>
  )
}
