import { Checkbox } from '@/components/ui/checkbox'
import { FieldError } from '@/components/ui/field'
import type { Role } from '@/lib/contracts/common'
import { roles, roleWords } from '@/lib/contracts/common'

const does: Record<Role, string> = {
  owner: 'invites, sets roles and settings',
  'drum-tech': 'kits, notes, plots, patch, revisions, benches',
  'tour-manager': 'tours, shows, hires, directory, advances, sending',
  viewer: 'reads everything, changes nothing',
}

export interface RoleBoxesProps {
  legend: string
  /** Keeps the boxes of two forms on one page apart. */
  idPrefix: string
  value: readonly Role[]
  onChange: (value: Role[]) => void
  error?: string | undefined
}

/** Roles are a set: any of them together. */
export function RoleBoxes({ legend, idPrefix, value, onChange, error }: RoleBoxesProps) {
  const errorId = `${idPrefix}-roles-error`
  return (
    <fieldset aria-describedby={error ? errorId : undefined}>
      <legend className="mb-1 text-sm font-bold">{legend}</legend>
      <div className="grid gap-x-6 sm:grid-cols-2">
        {roles.map((role) => (
          <Checkbox
            key={role}
            id={`${idPrefix}-${role}`}
            label={roleWords[role]}
            hint={does[role]}
            checked={value.includes(role)}
            onChange={(event) =>
              onChange(roles.filter((other) => (other === role ? event.target.checked : value.includes(other))))
            }
          />
        ))}
      </div>
      {error && <FieldError id={errorId}>{error}</FieldError>}
    </fieldset>
  )
}
