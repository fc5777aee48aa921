'use client'

import { useQuery } from '@tanstack/react-query'
import type { Route } from 'next'
import { useMemo, useState } from 'react'
import { Button } from '@/components/ui/button'
import { ButtonLink } from '@/components/ui/button-link'
import { EmptyState } from '@/components/ui/empty-state'
import { Notice } from '@/components/ui/notice'
import { Table, TableHead } from '@/components/ui/table'
import { showToast } from '@/components/ui/toast'
import { kitPieces } from '@/lib/advance/kit-pieces'
import { useChangeChannel, useChannels, type ChannelChange } from '@/lib/client/channels'
import { useKit } from '@/lib/client/kit'
import { plotServer } from '@/lib/client/plot/plot-server'
import type { Channel } from '@/lib/contracts/channel'
import type { Entry } from '@/lib/contracts/kit'
import type { PlotAnswer } from '@/lib/contracts/plot'
import { AppError } from '@/lib/errors'
import { ChannelRow } from './channel-row'
import { channelDefaults } from '@/plots/index'
import { outputChoices, takenWords, type OutputChoice } from './output-choices'

export interface ChannelTableProps {
  plot: PlotAnswer
  channels: readonly Channel[]
  entries: readonly Entry[]
  reader: { readonly locale: string; readonly referenceHz: number }
  plotHref: string
  mayEdit: boolean
}

/** The channel list: every channel takes one output of a piece on the plot. */
export function ChannelTable({
  plot,
  channels: first,
  entries: firstEntries,
  reader,
  plotHref,
  mayEdit,
}: ChannelTableProps) {
  const { rigId } = plot
  const { locale, referenceHz } = reader
  const { data: channels } = useChannels(rigId, first)
  const { data: entries } = useKit(rigId, firstEntries)
  const { data: document } = useQuery({
    queryKey: ['plot', rigId, 'document'],
    queryFn: async () => (await plotServer(rigId).read()).document,
    initialData: plot.document,
  })
  const change = useChangeChannel(rigId)
  const [problem, setProblem] = useState<string | null>(null)
  const kit = useMemo(() => {
    const inKit = entries.filter((entry) => !entry.removed)
    return new Map(kitPieces({ kit: inKit, party: { referenceHz } }, locale).map((piece) => [piece.id, piece]))
  }, [entries, referenceHz, locale])
  const choices = useMemo(() => outputChoices(document, kit), [document, kit])
  const taken = new Set(channels.map((channel) => `${channel.pieceId} ${channel.output}`))
  const waiting = choices.filter((choice) => !taken.has(choice.value))

  async function make(wanted: ChannelChange): Promise<string | null> {
    try {
      await change.mutateAsync(wanted)
      setProblem(null)
      return null
    } catch (error) {
      return error instanceof AppError ? error.message : 'The channel was not saved. Please try again.'
    }
  }
  async function add(wanted: readonly (OutputChoice | null)[]) {
    const free = freeNumbers(channels, wanted.length)
    for (const [index, choice] of wanted.entries()) {
      const piece = choice && document.pieces[choice.pieceId]
      const defaults = choice && piece && channelDefaults(document, kit, piece, choice.output)
      const wrong = await make({
        do: 'add',
        id: crypto.randomUUID(),
        channel: {
          number: free[index] ?? 512,
          pieceId: choice?.pieceId ?? null,
          output: choice?.output ?? '',
          ...(defaults ?? { name: '', stand: '', phantom: false }),
        },
      })
      if (wrong !== null) return setProblem(wrong)
    }
  }
  async function remove(was: Channel) {
    setProblem(await make({ do: 'remove', was }))
    const { id, number, name, pieceId, output, stand, phantom } = was
    showToast(`Channel ${number} taken off the patch.`, {
      label: `Put channel ${number} back`,
      run: () =>
        void make({ do: 'add', id, channel: { number, name, pieceId, output, stand, phantom } }).then(setProblem),
    })
  }

  const tools = mayEdit && (
    <div className="flex flex-wrap gap-2">
      {waiting.length > 0 && (
        <Button kind="primary" onClick={() => void add([...waiting].sort((a, b) => a.rank - b.rank))}>
          {waiting.length === 1
            ? 'Add a channel for the output that has none'
            : `Add channels for the ${waiting.length} outputs that have none`}
        </Button>
      )}
      <Button onClick={() => void add([null])}>Add an empty channel</Button>
    </div>
  )
  return (
    <div className="flex flex-col gap-4">
      {problem !== null && <Notice kind="error">{problem}</Notice>}
      {channels.length === 0 ? (
        <EmptyState
          title="No channels yet"
          action={choices.length > 0 ? tools : <ButtonLink href={plotHref as Route}>Go to the plot</ButtonLink>}
        >
          {choices.length > 0
            ? 'Each microphone, DI, pad and playback on the plot has outputs; give them channels here.'
            : 'Channels take the outputs of pieces. Put microphones, DIs or playback on the plot first.'}
        </EmptyState>
      ) : (
        <>
          <Table
            caption={`${channels.length === 1 ? '1 channel' : `${channels.length} channels`}, ${channels.filter((channel) => channel.phantom).length} with phantom`}
            head={
              <>
                <TableHead>Number</TableHead>
                <TableHead>Name</TableHead>
                <TableHead>Takes</TableHead>
                <TableHead>Stand</TableHead>
                <TableHead>Phantom</TableHead>
                {mayEdit && (
                  <TableHead>
                    <span className="sr-only">Take off</span>
                  </TableHead>
                )}
              </>
            }
          >
            {channels.map((channel) => (
              <ChannelRow
                key={channel.id}
                channel={channel}
                choices={choices}
                taken={takenWords(document, kit, channel)}
                isGone={channel.pieceId !== null && !document.pieces[channel.pieceId]}
                mayEdit={mayEdit}
                onChange={(next) => make({ do: 'change', was: channel, channel: next })}
                onRemove={() => void remove(channel)}
              />
            ))}
          </Table>
          {tools}
        </>
      )}
    </div>
  )
}

/** The lowest channel numbers that nothing has. */
function freeNumbers(channels: readonly Channel[], count: number): number[] {
  const taken = new Set(channels.map((channel) => channel.number))
  const free: number[] = []
  for (let number = 1; free.length < count; number += 1) if (!taken.has(number)) free.push(number)
  return free
}
