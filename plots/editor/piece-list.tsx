'use client'

import { Button } from '@/components/ui/button'
import { EmptyState } from '@/components/ui/empty-state'
import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'
import { outputWords } from '@/lib/advance/kit-words'
import { pieceHeadingDeg } from '../model/heading'
import { piecesInOrder } from '../model/document'
import { outputsOf, pieceKindOf, pieceLevel } from '../symbols/piece-kinds'
import { AimSelect } from './aim-select'
import { ChannelBox } from './channel-box'
import { CommitInput } from './commit-input'
import type { EditorParts } from './editor-context'
import { boxUnit, lengthInBox, placeAction, turnAction } from './piece-fields'
import { kindWords } from './piece-words'

/** Every piece as a row: all that the drawing can do, without a pointer. */
export function PieceList({
  parts,
  chosen,
  onChoose,
  onRemove,
}: {
  parts: EditorParts
  chosen: ReadonlySet<string>
  onChoose: (pieceIds: readonly string[]) => void
  onRemove: (pieceId: string) => void
}) {
  const { document, kit, units, mayEdit, act, nameOf } = parts
  const pieces = piecesInOrder(document).sort(
    (a, b) => pieceLevel(b, kit) - pieceLevel(a, kit) || nameOf(a).localeCompare(nameOf(b)),
  )
  if (pieces.length === 0)
    return (
      <EmptyState title="Nothing is on the plot yet">
        Choose something under “Not on the plot yet” and press Enter. It then stands here, with its place.
      </EmptyState>
    )
  return (
    <Table
      caption={`${pieces.length} pieces on the plot; places are to stage left of the centre line and upstage of the edge`}
      head={
        <>
          <TableHead>Piece</TableHead>
          <TableHead>To stage left</TableHead>
          <TableHead>Upstage</TableHead>
          <TableHead>Turned</TableHead>
          <TableHead>Aims at</TableHead>
          <TableHead>Channels</TableHead>
          {mayEdit && <TableHead>Off</TableHead>}
        </>
      }
    >
      {pieces.map((piece) => {
        const name = nameOf(piece)
        const does = (made: ReturnType<typeof placeAction>, said: string) =>
          typeof made === 'string' ? made : act([made], said)
        return (
          <TableRow key={piece.id} aria-selected={chosen.has(piece.id)}>
            <TableCell className={chosen.has(piece.id) ? 'border-l-4 border-spike pl-2!' : ''}>
              <button
                type="button"
                className="min-h-7 text-left font-bold underline underline-offset-4"
                aria-pressed={chosen.has(piece.id)}
                onClick={() => onChoose(chosen.has(piece.id) ? [] : [piece.id])}
              >
                {name}
              </button>
              <span className="block text-sm text-soft">{kindWords(piece, kit, units)}</span>
            </TableCell>
            {(['xM', 'yM'] as const).map((axis) => (
              <TableCell key={axis} className="min-w-24">
                <CommitInput
                  label={`${name}, ${axis === 'xM' ? 'to stage left' : 'upstage'}`}
                  isLabelHidden
                  value={lengthInBox(piece[axis], units)}
                  unit={boxUnit(units)}
                  disabled={!mayEdit}
                  onCommit={(typed) => does(placeAction(piece, axis, typed, units), `${name} moved`)}
                />
              </TableCell>
            ))}
            <TableCell className="min-w-20">
              <CommitInput
                label={`${name}, turned`}
                isLabelHidden
                value={String(Math.round(pieceHeadingDeg(document, piece)))}
                unit="°"
                disabled={!mayEdit || piece.aim !== null}
                onCommit={(typed) => does(turnAction(piece, typed), `${name} turned`)}
              />
            </TableCell>
            <TableCell className="min-w-32">
              {pieceKindOf(piece)?.aims && <AimSelect parts={parts} piece={piece} isLabelHidden />}
            </TableCell>
            <TableCell className="min-w-20">
              {outputsOf(piece).map((output) => (
                <div key={output} className="flex items-center gap-2">
                  {output !== 'mic' && <span className="text-sm text-soft">{outputWords(output)}</span>}
                  <ChannelBox parts={parts} piece={piece} output={output} isLabelHidden />
                </div>
              ))}
            </TableCell>
            {mayEdit && (
              <TableCell>
                <Button
                  kind="quiet"
                  className="px-1 whitespace-nowrap"
                  onClick={() => onRemove(piece.id)}
                  aria-label={`Take ${name} off the plot`}
                >
                  Take off
                </Button>
              </TableCell>
            )}
          </TableRow>
        )
      })}
    </Table>
  )
}
