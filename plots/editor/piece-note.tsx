'use client'

import { Button } from '@/components/ui/button'
import { Checkbox } from '@/components/ui/checkbox'
import { Field } from '@/components/ui/field'
import { Select } from '@/components/ui/select'
import { pieceHeadingDeg } from '../model/heading'
import { piecesInOrder, pieceSets, type Piece, type PieceSet } from '../model/document'
import type { PlotAction } from '../model/command'
import { outputsOf, pieceKindOf } from '../symbols/piece-kinds'
import { TURN_DEG, turnBy } from '../tools/turn-pieces'
import { AimSelect } from './aim-select'
import { ChannelBox } from './channel-box'
import { CommitInput } from './commit-input'
import type { EditorParts } from './editor-context'
import { boxUnit, lengthInBox, optionalLengthAction, placeAction, turnAction } from './piece-fields'
import { kindWords, placeWords } from './piece-words'

const setWords: Record<PieceSet, string> = {
  ours: 'our set',
  support: 'the support’s set',
  changeover: 'the changeover',
}

/** A piece's particulars, in the margin. */
export function PieceNote({ parts, piece, onRemove }: { parts: EditorParts; piece: Piece; onRemove: () => void }) {
  const { document, kit, units, mayEdit, act, nameOf } = parts
  const kind = pieceKindOf(piece)
  const entry = piece.kitEntryId === null ? undefined : kit.get(piece.kitEntryId)
  const name = nameOf(piece)
  const unit = boxUnit(units)
  const heading = Math.round(pieceHeadingDeg(document, piece))
  const own = piece.kitEntryId === null
  const does = (made: PlotAction | string, said: string): string | null =>
    typeof made === 'string' ? made : act([made], said)
  const edit = (changes: Extract<PlotAction, { type: 'edit' }>['changes']): PlotAction => ({
    type: 'edit',
    pieceId: piece.id,
    changes,
  })
  const microphones = piecesInOrder(document).filter((other) => other.aim?.pieceId === piece.id)

  return (
    <aside aria-label={`${name}, particulars`} className="flex w-full flex-col gap-3">
      <header>
        <h2 className="text-2xl">{name}</h2>
        <p className="text-sm text-soft">{kindWords(piece, kit, units)}</p>
        <p className="text-sm text-soft">{placeWords(piece, units)}</p>
      </header>
      {(entry?.kind === 'drum' || microphones.length > 0) && (
        <dl>
          {entry?.kind === 'drum' && entry.noteLabel !== null && (
            <NoteRow term="note" value={`${entry.noteLabel}  ${entry.noteHz?.toFixed(1) ?? ''} Hz`} />
          )}
          {microphones.map((microphone) => {
            const channel = parts.channels.find((one) => one.pieceId === microphone.id)
            return (
              <NoteRow
                key={microphone.id}
                term="mic"
                value={`${nameOf(microphone)}${channel ? `, ch ${channel.number}` : ', no channel'}`}
              />
            )
          })}
        </dl>
      )}
      <div className="grid grid-cols-2 gap-2">
        <CommitInput
          label="To stage left"
          value={lengthInBox(piece.xM, units)}
          unit={unit}
          disabled={!mayEdit}
          onCommit={(typed) => does(placeAction(piece, 'xM', typed, units), `${name} moved`)}
        />
        <CommitInput
          label="Upstage"
          value={lengthInBox(piece.yM, units)}
          unit={unit}
          disabled={!mayEdit}
          onCommit={(typed) => does(placeAction(piece, 'yM', typed, units), `${name} moved`)}
        />
        {piece.aim === null && (
          <CommitInput
            label="Turned"
            value={String(heading)}
            unit="°"
            disabled={!mayEdit}
            onCommit={(typed) => does(turnAction(piece, typed), `${name} turned`)}
          />
        )}
        {kind?.aims && (
          <CommitInput
            label="Height"
            value={piece.zM === null ? '' : lengthInBox(piece.zM, units)}
            unit={unit}
            disabled={!mayEdit}
            onCommit={(typed) =>
              does(
                optionalLengthAction(typed, units, (zM) => edit({ zM })),
                `${name} at another height`,
              )
            }
          />
        )}
        {own && kind && kind.kind !== 'microphone' && kind.kind !== 'text' && (
          <>
            <CommitInput
              label={kind.shape === 'circle' ? 'Across' : 'Wide'}
              value={lengthInBox(piece.widthM ?? kind.widthM, units)}
              unit={unit}
              disabled={!mayEdit}
              onCommit={(typed) =>
                does(
                  optionalLengthAction(typed, units, (widthM) => edit({ widthM })),
                  `${name} resized`,
                )
              }
            />
            {kind.shape === 'rect' && (
              <CommitInput
                label="Deep"
                value={lengthInBox(piece.depthM ?? kind.depthM, units)}
                unit={unit}
                disabled={!mayEdit}
                onCommit={(typed) =>
                  does(
                    optionalLengthAction(typed, units, (depthM) => edit({ depthM })),
                    `${name} resized`,
                  )
                }
              />
            )}
            <CommitInput
              label="High"
              value={lengthInBox(piece.heightM ?? kind.heightM, units)}
              unit={unit}
              disabled={!mayEdit}
              onCommit={(typed) =>
                does(
                  optionalLengthAction(typed, units, (heightM) => edit({ heightM })),
                  `${name} resized`,
                )
              }
            />
          </>
        )}
      </div>
      {kind?.aims && <AimSelect parts={parts} piece={piece} />}
      {outputsOf(piece).length > 0 && (
        <div className="grid grid-cols-2 gap-2">
          {outputsOf(piece).map((output) => (
            <ChannelBox key={output} parts={parts} piece={piece} output={output} />
          ))}
        </div>
      )}
      <CommitInput
        label="Words on the plot"
        isText
        value={piece.label}
        hint={entry ? `Empty: ${entry.name}, as the kit says` : ''}
        disabled={!mayEdit}
        onCommit={(typed) => does(edit({ label: typed }), 'Renamed')}
      />
      <Field label="Belongs to">
        {(control) => (
          <Select
            {...control}
            options={pieceSets.map((set) => ({ value: set, label: setWords[set] }))}
            value={piece.set}
            disabled={!mayEdit}
            onChange={(event) => {
              const set = pieceSets.find((one) => one === event.currentTarget.value)
              if (set) act([edit({ set })], `${name}: ${setWords[set]}`)
            }}
          />
        )}
      </Field>
      {mayEdit && (
        <>
          <Checkbox
            label="Locked where it stands"
            checked={piece.locked}
            onChange={(event) =>
              act(
                [edit({ locked: event.currentTarget.checked })],
                event.currentTarget.checked ? `${name} locked` : `${name} unlocked`,
              )
            }
          />
          <div className="flex flex-wrap gap-2">
            {piece.aim === null && !piece.locked && (
              <>
                <Turn parts={parts} piece={piece} byDeg={-TURN_DEG} />
                <Turn parts={parts} piece={piece} byDeg={TURN_DEG} />
              </>
            )}
            <Button className="px-3" onClick={onRemove}>
              Take off the plot
            </Button>
          </div>
        </>
      )}
    </aside>
  )
}

/** Several pieces chosen at once. */
export function ManyNote({ count, mayEdit, onRemove }: { count: number; mayEdit: boolean; onRemove: () => void }) {
  return (
    <aside aria-label={`${count} pieces chosen`} className="flex flex-col items-start gap-3">
      <h2 className="text-2xl">{count} pieces</h2>
      <p className="text-sm text-soft">
        {mayEdit ? 'They move and turn together. ' : ''}Press one with Shift to take it out, or an empty place to let
        go.
      </p>
      {mayEdit && (
        <Button className="px-3" onClick={onRemove}>
          Take {count} pieces off the plot
        </Button>
      )}
    </aside>
  )
}

function Turn({ parts, piece, byDeg }: { parts: EditorParts; piece: Piece; byDeg: number }) {
  return (
    <Button
      className="px-3"
      onClick={() => {
        const action = turnBy(parts.document, [piece.id], byDeg)
        if (action)
          parts.act([action], `${parts.nameOf(piece)} turned to ${Math.round(action.turns[0]?.rotationDeg ?? 0)}°`)
      }}
    >
      {byDeg < 0 ? `Turn back ${-byDeg}°` : `Turn on ${byDeg}°`}
    </Button>
  )
}

function NoteRow({ term, value }: { term: string; value: string }) {
  return (
    <div className="flex items-baseline justify-between gap-4 border-b border-line py-1">
      <dt className="text-sm text-soft">{term}</dt>
      <dd className="figures text-right text-[0.9375rem] font-bold">{value}</dd>
    </div>
  )
}
