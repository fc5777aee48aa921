import { partySchema } from '@/lib/contracts/party'
import { doneSchema } from '@/lib/contracts/sign-in'
import { callApi } from './http'

/** What a signed-in person does with their own account, in whatever party or none. */

export function createParty(input: { id: string; name: string }) {
  return callApi('/api/parties', { method: 'POST', body: input, response: partySchema })
}

/** Takes another party in hand on this device. */
export function switchParty(partyId: string) {
  return callApi('/api/sessions/party', { method: 'POST', body: { partyId }, response: doneSchema })
}

export function signOutDevice(id: string) {
  return callApi(`/api/sessions/${id}`, { method: 'DELETE', response: doneSchema })
}

export function signOutEverywhere() {
  return callApi('/api/sessions', { method: 'DELETE', response: doneSchema })
}

export function changePassword(input: { current: string | null; password: string }) {
  return callApi('/api/sessions/password', { method: 'PUT', body: input, response: doneSchema })
}
