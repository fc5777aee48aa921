'use client'

import { Field } from '@/components/ui/field'
import { Select } from '@/components/ui/select'
import { useChangeChannel } from '@/lib/client/channels'
import { piecesInOrder, type Piece } from '../model/document'
import { channelDefaults } from '../symbols/channel-defaults'
import type { EditorParts } from './editor-context'

/** What a microphone aims at. */
export function AimSelect({
  parts,
  piece,
  isLabelHidden,
}: {
  parts: EditorParts
  piece: Piece
  isLabelHidden?: boolean
}) {
  const { rigId, document, kit, channels, act, nameOf, mayEdit, mayPatch } = parts
  const change = useChangeChannel(rigId)
  const targets = piecesInOrder(document)
    .filter(
      (other) => other.id !== piece.id && !['microphone', 'text', 'riser', 'rug', 'hardware'].includes(other.kind),
    )
    .map((other) => ({ value: other.id, label: nameOf(other) }))
    .sort((a, b) => a.label.localeCompare(b.label))
  const isGone = piece.aim !== null && !document.pieces[piece.aim.pieceId]

  /** A channel of the usual name is named for what the microphone hears now; a name somebody typed stays. */
  function renameChannel(aim: Piece['aim']) {
    const was = channels.find((channel) => channel.pieceId === piece.id && channel.output === 'mic')
    if (!mayPatch || !was || was.name !== channelDefaults(document, kit, piece, 'mic').name) return
    const { number, pieceId, output, stand, phantom } = was
    const { name } = channelDefaults(document, kit, { ...piece, aim }, 'mic')
    change.mutate({ do: 'change', was, channel: { number, name, pieceId, output, stand, phantom } })
  }

  return (
    <Field label={isLabelHidden ? <span className="sr-only">Aims at</span> : 'Aims at'}>
      {(control) => (
        <Select
          {...control}
          placeholder={isGone ? 'a piece that is gone' : 'nothing'}
          options={targets}
          value={isGone ? '' : (piece.aim?.pieceId ?? '')}
          disabled={!mayEdit}
          onKeyDown={(event) => event.stopPropagation()}
          onChange={(event) => {
            const at = event.currentTarget.value || null
            const target = at === null ? undefined : document.pieces[at]
            const refused = act(
              [{ type: 'aim', pieceId: piece.id, at }],
              target ? `${nameOf(piece)} aims at ${nameOf(target)}` : `${nameOf(piece)} aims at nothing`,
            )
            if (refused === null) renameChannel(at === null ? null : { pieceId: at })
          }}
        />
      )}
    </Field>
  )
}
