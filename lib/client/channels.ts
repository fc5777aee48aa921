'use client'

import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { callApi } from '@/lib/client/http'
import { channelListSchema, channelSchema, type Channel, type ChannelInput } from '@/lib/contracts/channel'

const keyOf = (rigId: string) => ['patch', rigId]

/** The rig's channels, by number. */
export function useChannels(rigId: string, initial: readonly Channel[]) {
  return useQuery({
    queryKey: keyOf(rigId),
    queryFn: async ({ signal }) =>
      (await callApi(`/api/rigs/${rigId}/channels`, { response: channelListSchema, signal })).channels,
    initialData: [...initial],
  })
}

export type ChannelChange =
  | { readonly do: 'add'; readonly id: string; readonly channel: ChannelInput }
  | { readonly do: 'change'; readonly was: Channel; readonly channel: ChannelInput }
  | { readonly do: 'remove'; readonly was: Channel }

/** Adds, changes or removes one channel, and shows the list as it then is. */
export function useChangeChannel(rigId: string) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (change: ChannelChange) => {
      switch (change.do) {
        case 'add':
          return callApi(`/api/rigs/${rigId}/channels`, {
            method: 'POST',
            body: { id: change.id, channel: change.channel },
            response: channelSchema,
          })
        case 'change':
          return callApi(`/api/channels/${change.was.id}`, {
            method: 'PATCH',
            body: { version: change.was.version, channel: change.channel },
            response: channelSchema,
          })
        case 'remove':
          return callApi(`/api/channels/${change.was.id}`, {
            method: 'DELETE',
            body: { version: change.was.version },
            response: channelSchema,
          })
      }
    },
    onSettled: () => client.invalidateQueries({ queryKey: keyOf(rigId) }),
  })
}
