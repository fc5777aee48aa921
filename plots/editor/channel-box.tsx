'use client'

import { outputWords } from '@/lib/advance/kit-words'
import { useChangeChannel } from '@/lib/client/channels'
import { AppError } from '@/lib/errors'
import type { Piece } from '../model/document'
import { channelDefaults } from '../symbols/channel-defaults'
import { CommitInput } from './commit-input'
import type { EditorParts } from './editor-context'

/** The channel that takes one output of a piece: a number gives it one, emptying takes it away. */
export function ChannelBox({
  parts,
  piece,
  output,
  isLabelHidden,
}: {
  parts: EditorParts
  piece: Piece
  output: string
  isLabelHidden?: boolean
}) {
  const { rigId, channels, kit, mayPatch, document } = parts
  const change = useChangeChannel(rigId)
  const was = channels.find((channel) => channel.pieceId === piece.id && channel.output === output)

  async function commit(typed: string): Promise<string | null> {
    const number = Number(typed)
    if (typed !== '' && !(Number.isInteger(number) && number >= 1 && number <= 512))
      return 'Write a channel number from 1 to 512, or nothing'
    try {
      if (typed === '') {
        if (was) await change.mutateAsync({ do: 'remove', was })
      } else if (was) {
        const { name, stand, phantom } = was
        await change.mutateAsync({
          do: 'change',
          was,
          channel: { number, name, pieceId: piece.id, output, stand, phantom },
        })
      } else {
        await change.mutateAsync({
          do: 'add',
          id: crypto.randomUUID(),
          channel: {
            number,
            pieceId: piece.id,
            output,
            ...channelDefaults(document, kit, piece, output),
          },
        })
      }
      return null
    } catch (error) {
      return error instanceof AppError ? error.message : 'The channel was not saved. Please try again.'
    }
  }

  return (
    <CommitInput
      label={output === 'mic' ? 'Channel' : `Channel of ${outputWords(output)}`}
      isLabelHidden={isLabelHidden ?? false}
      value={was ? String(was.number) : ''}
      disabled={!mayPatch}
      onCommit={commit}
    />
  )
}
