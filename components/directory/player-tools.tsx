'use client'

import { OpenedForm } from '@/components/form/opened-form'
import { RemoveButton } from '@/components/form/remove-button'
import { players } from '@/lib/client/directory'
import type { Player } from '@/lib/contracts/player'
import type { LengthUnits } from '@/lib/staging/length'
import { PlayerForm } from './player-form'

export function AddPlayer({ units, first }: { units: LengthUnits; first: boolean }) {
  return (
    <OpenedForm action={first ? 'Add the first player' : 'Add a player'} kind={first ? 'primary' : 'secondary'}>
      {(close) => <PlayerForm player={null} units={units} onClose={close} />}
    </OpenedForm>
  )
}

/** What can be done with a player in the list. */
export function PlayerTools({ player, units }: { player: Player; units: LengthUnits }) {
  const { id, version, name, hand, throneHeightM } = player
  return (
    <div className="-ml-4 flex flex-wrap items-center gap-x-2">
      <OpenedForm action={`Change ${name}`} kind="quiet">
        {(close) => <PlayerForm player={player} units={units} onClose={close} />}
      </OpenedForm>
      <RemoveButton
        action={`Take ${name} away`}
        busy="Taking the player away"
        done={`${name} is gone`}
        remove={() => players.remove(id, version)}
        undo={{
          label: `Put ${name} back`,
          run: () => players.create('/api/players', id, { name, hand, throneHeightM }),
        }}
      />
    </div>
  )
}
