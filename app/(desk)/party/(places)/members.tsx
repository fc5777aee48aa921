'use client'

import type { ReactNode } from 'react'
import { useState } from 'react'
import { LocalTime } from '@/components/desk/local-time'
import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import { useEndLoan, useMembers } from '@/lib/client/members'
import { roleWords } from '@/lib/contracts/common'
import type { LentRole, Members as MembersData, MemberView } from '@/lib/contracts/member'
import { LendForm } from './lend-form'
import { MemberEditor } from './member-editor'

export interface MembersProps {
  partyId: string
  readerId: string
  manages: boolean
  initial: MembersData
}

export function Members({ partyId, readerId, manages, initial }: MembersProps) {
  const { data } = useMembers(partyId, initial)
  const [editing, setEditing] = useState<string | null>(null)
  const [lending, setLending] = useState(false)

  return (
    <section aria-labelledby="members-title">
      <div className="flex flex-wrap items-end justify-between gap-3">
        <h1 id="members-title" className="text-4xl">
          Members
        </h1>
        {data.mayLend.length > 0 && !lending && <Button onClick={() => setLending(true)}>Lend a role</Button>}
      </div>
      {lending && (
        <LendForm partyId={partyId} members={data.members} mayLend={data.mayLend} onDone={() => setLending(false)} />
      )}
      <ul className="mt-5 border-t-2 border-ink">
        {data.members.map((member) => (
          <li key={member.personId} className="border-b border-line py-3">
            <MemberRow
              member={member}
              isReader={member.personId === readerId}
              partyId={partyId}
              action={
                manages && (
                  <Button
                    kind="quiet"
                    className="-ml-4 sm:ml-0"
                    aria-expanded={editing === member.personId}
                    onClick={() => setEditing(editing === member.personId ? null : member.personId)}
                  >
                    {editing === member.personId ? 'Leave as it is' : 'Change roles'}
                    <span className="sr-only"> of {member.name}</span>
                  </Button>
                )
              }
            />
            {editing === member.personId && (
              <MemberEditor partyId={partyId} member={member} onDone={() => setEditing(null)} />
            )}
          </li>
        ))}
      </ul>
    </section>
  )
}

interface MemberRowProps {
  member: MemberView
  isReader: boolean
  partyId: string
  action: ReactNode
}

function MemberRow({ member, isReader, partyId, action }: MemberRowProps) {
  return (
    <div className="flex flex-wrap items-start gap-x-6 gap-y-1">
      <div className="min-w-0 basis-80">
        <p className="name text-lg">
          {member.name}
          {isReader && <span className="font-text text-sm font-normal text-soft"> you</span>}
        </p>
        <p className="text-sm wrap-anywhere text-soft">{member.email}</p>
      </div>
      <div className="min-w-0 grow basis-56">
        <p>{member.roles.map((role) => roleWords[role]).join(', ')}</p>
        {member.lent.map((loan) => (
          <Loan key={loan.id} loan={loan} partyId={partyId} holder={member.name} />
        ))}
      </div>
      {action}
    </div>
  )
}

function Loan({ loan, partyId, holder }: { loan: LentRole; partyId: string; holder: string }) {
  const end = useEndLoan(partyId)
  return (
    <div className="mt-1 border-l-4 border-brass pl-2 text-sm">
      <p>
        <strong className="text-brass">Stand-in {roleWords[loan.role]}</strong> until <LocalTime iso={loan.untilAt} />,
        lent by {loan.lentBy}
      </p>
      {loan.mayEnd && (
        <Button
          kind="quiet"
          className="-ml-4"
          busy={end.isPending ? 'Ending' : null}
          onClick={() => end.mutate(loan.id)}
        >
          End it now<span className="sr-only">: {roleWords[loan.role]} lent to {holder}</span>
        </Button>
      )}
      {end.error && <Notice kind="error">{end.error.message}</Notice>}
    </div>
  )
}
