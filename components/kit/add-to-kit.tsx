import { Menu } from '@/components/ui/menu'
import { Button } from '@/components/ui/button'
import type { EntryInput, EntryKind } from '@/lib/contracts/kit'
import { drumRoles, drumRoleWords } from '@/lib/contracts/kit'
import { newDrum, newPiece } from '@/lib/contracts/kit-defaults'

export interface AddToKitProps {
  kind: EntryKind
  onAdd: (start: EntryInput) => void
}

const addWords = { cymbal: 'Add a cymbal', hardware: 'Add hardware', microphone: 'Add a microphone' }

/** Opens the form of a new entry of a kind, filled with what is usual. */
export function AddToKit({ kind, onAdd }: AddToKitProps) {
  if (kind !== 'drum') return <Button onClick={() => onAdd(newPiece(kind))}>{addWords[kind]}</Button>
  return (
    <Menu
      align="end"
      label="Add a drum"
      items={drumRoles.map((role) => ({
        key: role,
        label: `A ${drumRoleWords[role]}`,
        onSelect: () => onAdd(newDrum(role)),
      }))}
    />
  )
}
