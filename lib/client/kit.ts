'use client'

import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { callApi } from '@/lib/client/http'
import type { Entry, EntryInput, Kit, SetNotes } from '@/lib/contracts/kit'
import { entrySchema, kitSchema } from '@/lib/contracts/kit'
import { AppError } from '@/lib/errors'

const kitKey = (rigId: string) => ['kit', rigId, 'all']

/** Every entry of a rig's kit in its order, taken-out ones too. */
export function useKit(rigId: string, initial: readonly Entry[]) {
  return useQuery({
    queryKey: kitKey(rigId),
    queryFn: async ({ signal }) =>
      (await callApi(`/api/rigs/${rigId}/kit?removed=true`, { response: kitSchema, signal })).entries,
    initialData: [...initial],
  })
}

const longestWaitMs = 10_000

/**
 * A change of the kit. Without a connection it is sent again until it gets through: every request here may come twice. It is
 * done when the list shows it.
 */
function useKitChange<Change, Answer>(rigId: string, send: (change: Change) => Promise<Answer>) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: send,
    retry: (_count, error) => error instanceof AppError && error.code === 'unavailable',
    retryDelay: (count) => Math.min(1000 * 2 ** count, longestWaitMs),
    onSettled: () => client.invalidateQueries({ queryKey: ['kit', rigId] }),
  })
}

export type SavedEntry =
  | { readonly do: 'add'; readonly id: string; readonly entry: EntryInput }
  | { readonly do: 'change'; readonly id: string; readonly version: number; readonly entry: EntryInput }

export function useSaveEntry(rigId: string) {
  return useKitChange(rigId, (save: SavedEntry): Promise<Entry> => {
    const { id, entry } = save
    return save.do === 'add'
      ? callApi(`/api/rigs/${rigId}/kit/entries`, { method: 'POST', body: { id, entry }, response: entrySchema })
      : callApi(`/api/kit-entries/${id}`, {
          method: 'PATCH',
          body: { version: save.version, entry },
          response: entrySchema,
        })
  })
}

/** Takes an entry out of the kit, or puts it back. */
export function useMarkEntry(rigId: string) {
  return useKitChange(rigId, ({ entry, removed }: { entry: Entry; removed: boolean }) =>
    callApi(removed ? `/api/kit-entries/${entry.id}` : `/api/kit-entries/${entry.id}/restore`, {
      method: removed ? 'DELETE' : 'POST',
      body: { version: entry.version },
      response: entrySchema,
    }),
  )
}

export function useOrderKit(rigId: string) {
  return useKitChange(rigId, (entryIds: readonly string[]): Promise<Kit> =>
    callApi(`/api/rigs/${rigId}/kit/order`, { method: 'PUT', body: { entryIds }, response: kitSchema }),
  )
}

export function useAddSet(rigId: string) {
  return useKitChange(rigId, (entries: readonly { id: string; entry: EntryInput }[]): Promise<Kit> =>
    callApi(`/api/rigs/${rigId}/kit/set`, { method: 'POST', body: { entries }, response: kitSchema }),
  )
}

export function useCopyKit(rigId: string) {
  return useKitChange(rigId, (copy: { copyId: string; fromRigId: string }): Promise<Kit> =>
    callApi(`/api/rigs/${rigId}/kit/copy`, { method: 'POST', body: copy, response: kitSchema }),
  )
}

export function useSetNotes(rigId: string) {
  return useKitChange(rigId, (notes: SetNotes['notes']): Promise<Kit> =>
    callApi(`/api/rigs/${rigId}/kit/notes`, { method: 'PUT', body: { notes }, response: kitSchema }),
  )
}
