'use client'

import { Field } from '@/components/ui/field'
import { Select } from '@/components/ui/select'
import { piecesInOrder, type Piece } from '../model/document'
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
  const { document, act, nameOf, mayEdit } = parts
  const targets = piecesInOrder(document)
    .filter(
      (other) => other.id !== piece.id && !['microphone', 'text', 'riser', 'rug', 'hardware'].includes(other.kind),
    )
    .map((other) => ({ value: other.id, label: nameOf(other) }))
    .sort((a, b) => a.label.localeCompare(b.label))
  const isGone = piece.aim !== null && !document.pieces[piece.aim.pieceId]
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
            act(
              [{ type: 'aim', pieceId: piece.id, at }],
              target ? `${nameOf(piece)} aims at ${nameOf(target)}` : `${nameOf(piece)} aims at nothing`,
            )
          }}
        />
      )}
    </Field>
  )
}
