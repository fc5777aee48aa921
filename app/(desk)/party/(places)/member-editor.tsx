'use client'

import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import { showToast } from '@/components/ui/toast'
import { useChangeRoles, useRemoveMember } from '@/lib/client/members'
import type { Role } from '@/lib/contracts/common'
import { roleWords } from '@/lib/contracts/common'
import type { MemberView } from '@/lib/contracts/member'
import { roleSetSchema } from '@/lib/contracts/member'
import { RoleBoxes } from './role-boxes'

const words = (roles: readonly Role[]) => roles.map((role) => roleWords[role]).join(', ')

/** Sets one member's roles, or takes the member out. Somebody else's change meanwhile shows above what was ticked here. */
export function MemberEditor({ partyId, member, onDone }: { partyId: string; member: MemberView; onDone: () => void }) {
  const [roles, setRoles] = useState<Role[]>(member.roles)
  const change = useChangeRoles(partyId)
  const remove = useRemoveMember(partyId)
  const refusal = change.error ?? remove.error
  const fault = roleSetSchema.safeParse(roles).error?.issues[0]?.message

  const save = () => {
    if (fault) return
    const before = member.roles
    change.mutate(
      { personId: member.personId, version: member.version, roles },
      {
        onSuccess: (changed) => {
          onDone()
          showToast(`${member.name} is now ${words(changed.roles)}.`, {
            label: `Back to ${words(before)}`,
            run: () => change.mutate({ personId: member.personId, version: changed.version, roles: before }),
          })
        },
      },
    )
  }

  return (
    <div className="mt-3 border border-ink bg-sheet p-4">
      {refusal && (
        <Notice kind="error" className="mb-3">
          {refusal.message} {member.name} is now {words(member.roles)}.
        </Notice>
      )}
      <RoleBoxes legend={`Roles of ${member.name}`} idPrefix={member.personId} value={roles} onChange={setRoles} error={fault} />
      <div className="mt-4 flex flex-wrap items-center gap-3">
        <Button kind="primary" aria-disabled={fault ? true : undefined} busy={change.isPending ? 'Saving' : null} onClick={save}>
          Save these roles
        </Button>
        <Button
          kind="quiet"
          className="-ml-4 sm:ml-0"
          busy={remove.isPending ? 'Taking out' : null}
          onClick={() => remove.mutate({ personId: member.personId, version: member.version }, { onSuccess: onDone })}
        >
          Take {member.name} out of the party
        </Button>
      </div>
      <p className="mt-2 text-sm text-soft">
        Roles hold from the next thing they do. What they made stays when they go; an invitation brings them back.
      </p>
    </div>
  )
}
