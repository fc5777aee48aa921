'use client'

import { useRouter } from 'next/navigation'
import { ChoiceField } from '@/components/form/choice-field'
import { LengthField } from '@/components/form/length-field'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { players } from '@/lib/client/directory'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { Player, PlayerInput } from '@/lib/contracts/player'
import { playerInputSchema, playerSchema } from '@/lib/contracts/player'
import type { LengthUnits } from '@/lib/staging/length'
import { formatLength } from '@/lib/staging/length'

const blank: PlayerInput = { name: '', hand: 'right', throneHeightM: null }
const names = { name: 'Name', hand: 'Hand', throneHeightM: 'Throne height' }
const handOptions = [
  { value: 'right', label: 'right-handed' },
  { value: 'left', label: 'left-handed' },
]

function fieldsOf({ name, hand, throneHeightM }: Player): PlayerInput {
  return { name, hand, throneHeightM }
}

export interface PlayerFormProps {
  player: Player | null
  units: LengthUnits
  onClose: () => void
}

/** Who sits behind the kit. */
export function PlayerForm({ player, units, onClose }: PlayerFormProps) {
  const router = useRouter()
  const saving = useSavingForm<PlayerInput, Player>({
    schema: playerInputSchema,
    start: player ? fieldsOf(player) : blank,
    version: player?.version ?? null,
    key: 'player',
    save: ({ id, version, fields }) =>
      player ? players.change(player.id, version, fields) : players.create('/api/players', id, fields),
    readCurrent: (current) => {
      const row = playerSchema.safeParse(current).data
      return row ? { version: row.version, fields: fieldsOf(row) } : null
    },
    onSaved: () => {
      onClose()
      router.refresh()
    },
  })
  const { form } = saving
  return (
    <SaveForm
      saving={saving}
      label={player ? player.name : 'New player'}
      action={player ? 'Save the player' : 'Add this player'}
      busy="Saving the player"
      names={names}
      say={(field, value) =>
        field === 'throneHeightM' && typeof value === 'number' ? formatLength(value, units) : undefined
      }
      onClose={onClose}
    >
      <div className="grid gap-4 sm:grid-cols-3">
        <TextField form={form} name="name" label="Name" />
        <ChoiceField form={form} name="hand" label="Hand" options={handOptions} />
        <LengthField
          form={form}
          name="throneHeightM"
          label="Throne height"
          units={units}
          optional
          hint="Top of the seat over the floor, such as 52 cm or 20 in"
        />
      </div>
    </SaveForm>
  )
}
