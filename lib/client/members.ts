import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import type { Role } from '@/lib/contracts/common'
import type { InvitationView, Invite, LendRole, Members } from '@/lib/contracts/member'
import {
  changedMemberSchema,
  invitationSchema,
  invitationsSchema,
  lentRoleSchema,
  membersSchema,
} from '@/lib/contracts/member'
import { doneSchema } from '@/lib/contracts/sign-in'
import { callApi } from './http'

/** Keys begin with the live topic of the party, so that a change anywhere reads them again. */
const partyKey = (partyId: string) => ['party', partyId] as const

export function useMembers(partyId: string, initialData: Members) {
  return useQuery({
    queryKey: [...partyKey(partyId), 'members'],
    queryFn: ({ signal }) => callApi('/api/members', { response: membersSchema, signal }),
    initialData,
  })
}

export function useInvitations(partyId: string, initialData: InvitationView[]) {
  return useQuery({
    queryKey: [...partyKey(partyId), 'invitations'],
    queryFn: async ({ signal }) =>
      (await callApi('/api/invitations', { response: invitationsSchema, signal })).invitations,
    initialData,
  })
}

/** A change of the party's people; refused or not, the lists are read again so that the reader sees what stands. */
function usePeopleChange<Input, Answer>(partyId: string, change: (input: Input) => Promise<Answer>) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: change,
    onSettled: () => client.invalidateQueries({ queryKey: partyKey(partyId) }),
  })
}

export function useChangeRoles(partyId: string) {
  return usePeopleChange(partyId, ({ personId, ...body }: { personId: string; version: number; roles: Role[] }) =>
    callApi(`/api/members/${personId}`, { method: 'PATCH', body, response: changedMemberSchema }),
  )
}

export function useRemoveMember(partyId: string) {
  return usePeopleChange(partyId, ({ personId, ...body }: { personId: string; version: number }) =>
    callApi(`/api/members/${personId}`, { method: 'DELETE', body, response: doneSchema }),
  )
}

export function useInvite(partyId: string) {
  return usePeopleChange(partyId, (body: Invite) =>
    callApi('/api/invitations', { method: 'POST', body, response: invitationSchema }),
  )
}

export function useSendInvitationAgain(partyId: string) {
  return usePeopleChange(partyId, (id: string) =>
    callApi(`/api/invitations/${id}/mails`, { method: 'POST', response: invitationSchema }),
  )
}

export function useWithdrawInvitation(partyId: string) {
  return usePeopleChange(partyId, (id: string) =>
    callApi(`/api/invitations/${id}`, { method: 'DELETE', response: doneSchema }),
  )
}

export function useLendRole(partyId: string) {
  return usePeopleChange(partyId, (body: LendRole) =>
    callApi('/api/stand-ins', { method: 'POST', body, response: lentRoleSchema }),
  )
}

export function useEndLoan(partyId: string) {
  return usePeopleChange(partyId, (id: string) =>
    callApi(`/api/stand-ins/${id}`, { method: 'DELETE', response: doneSchema }),
  )
}
