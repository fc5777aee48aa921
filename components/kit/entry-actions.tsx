import { Button } from '@/components/ui/button'
import { Menu } from '@/components/ui/menu'

export interface EntryActionsProps {
  /** Fixes the id of the Edit button, so that the focus can come back to it. */
  editId: string
  name: string
  /** Null at the end where it cannot move further. */
  onUp: (() => void) | null
  onDown: (() => void) | null
  onEdit: () => void
  onRemove: () => void
}

/** What can be done with an entry. */
export function EntryActions({ editId, name, onUp, onDown, onEdit, onRemove }: EntryActionsProps) {
  return (
    <div className="flex gap-1">
      <Button kind="quiet" id={editId} onClick={onEdit}>
        Edit<span className="sr-only"> {name}</span>
      </Button>
      <Menu
        kind="quiet"
        align="end"
        label={
          <>
            More<span className="sr-only"> for {name}</span>
          </>
        }
        items={[
          { key: 'up', label: 'Move up', disabled: !onUp, onSelect: () => onUp?.() },
          { key: 'down', label: 'Move down', disabled: !onDown, onSelect: () => onDown?.() },
          { key: 'remove', label: 'Take out of the kit', onSelect: onRemove },
        ]}
      />
    </div>
  )
}
