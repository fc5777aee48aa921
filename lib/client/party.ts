import { useMutation } from '@tanstack/react-query'
import type { UpdateParty } from '@/lib/contracts/party'
import { partySchema } from '@/lib/contracts/party'
import { callApi } from './http'

/** Saves the settings of the party in hand against the version that was seen. */
export function useChangeParty() {
  return useMutation({
    mutationFn: (input: UpdateParty) =>
      callApi('/api/parties/current', { method: 'PATCH', body: input, response: partySchema }),
  })
}
