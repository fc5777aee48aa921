'use client'

import { DndContext, DragOverlay } from '@dnd-kit/core'
import { useCallback, useMemo, useState, type KeyboardEvent } from 'react'
import { classes } from '@/components/ui/classes'
import { LiveRegion } from '@/components/ui/live-region'
import { showToast } from '@/components/ui/toast'
import { kitPieces } from '@/lib/advance/kit-pieces'
import { useChannels } from '@/lib/client/channels'
import { useKit } from '@/lib/client/kit'
import { usePlot } from '@/lib/client/plot/use-plot'
import type { Channel } from '@/lib/contracts/channel'
import type { Entry } from '@/lib/contracts/kit'
import type { PlotAnswer } from '@/lib/contracts/plot'
import type { PlotPoint } from '../geometry/point'
import { toPlot } from '../geometry/view'
import type { PlotAction } from '../model/command'
import type { Piece } from '../model/document'
import { channelKey } from '../render/build-scene'
import type { LengthUnits } from '../symbols/length-words'
import { pieceName } from '../symbols/piece-kinds'
import { pieceByItself, pieceOf, type ShelfItem } from '../tools/shelf'
import type { EditorParts } from './editor-context'
import { EditorBar } from './editor-bar'
import { PieceInHand, useShelfDrag } from './shelf-drag'
import { PieceList } from './piece-list'
import { ManyNote, PieceNote } from './piece-note'
import { placeWords } from './piece-words'
import { PlotNotices } from './save-state'
import { middleOf, Sheet } from './sheet'
import { Shelf } from './shelf'
import { kitBounds, piecesBounds, stageBounds } from './use-scene'
import { useListView } from './use-list-view'
import { useView } from './use-view'

export interface PlotEditorProps {
  plot: PlotAnswer
  entries: readonly Entry[]
  channels: readonly Channel[]
  reader: { readonly units: LengthUnits; readonly locale: string; readonly referenceHz: number }
  personId: string
  mayEdit: boolean
  mayPatch: boolean
}

const none: ReadonlySet<string> = new Set()

/** The plot of a rig, in hand: shelf, sheet, margin note and list over one document. */
export function PlotEditor(props: PlotEditorProps) {
  const { mayEdit, mayPatch, personId } = props
  const { units, locale, referenceHz } = props.reader
  const { rigId } = props.plot
  const { state, session } = usePlot({ initial: props.plot, personId })
  const { document } = state
  const { data: entries } = useKit(rigId, props.entries)
  const kit = useMemo(() => {
    const inKit = entries.filter((entry) => !entry.removed)
    return new Map(kitPieces({ kit: inKit, party: { referenceHz } }, locale).map((piece) => [piece.id, piece]))
  }, [entries, referenceHz, locale])
  const { data: channels } = useChannels(rigId, props.channels)
  const channelNumbers = useMemo(
    () =>
      new Map(
        channels.flatMap(({ pieceId, output, number }): [string, number][] =>
          pieceId === null ? [] : [[channelKey(pieceId, output), number]],
        ),
      ),
    [channels],
  )
  const [firstBounds] = useState(() => kitBounds(document, kit))
  const { view, setView, size, isWide, attach, fit, zoom } = useView(firstBounds)
  const [chosen, setChosen] = useState<ReadonlySet<string>>(none)
  const [armed, setArmed] = useState<ShelfItem | null>(null)
  const [isSnapping, setIsSnapping] = useState(true)
  const [isList, setIsList] = useListView()
  const [said, setSaid] = useState('')

  const nameOf = useCallback((piece: Piece) => pieceName(piece, kit), [kit])
  const choose = useCallback((pieceIds: readonly string[]) => setChosen(new Set(pieceIds)), [])
  const act = useCallback(
    (actions: readonly PlotAction[], done: string): string | null => {
      const refused = session.act(actions)
      setSaid(refused ? refused.message : done)
      return refused?.message ?? null
    },
    [session],
  )
  const parts: EditorParts = useMemo(
    () => ({ rigId, document, kit, channels, channelNumbers, units, mayEdit, mayPatch, act, nameOf }),
    [rigId, document, kit, channels, channelNumbers, units, mayEdit, mayPatch, act, nameOf],
  )

  function put(piece: Piece) {
    if (act([{ type: 'place', pieces: [piece] }], `${nameOf(piece)} placed, ${placeWords(piece, units)}`) === null)
      choose([piece.id])
    setArmed(null)
  }
  const putByItself = (item: ShelfItem) =>
    put(pieceByItself(item, crypto.randomUUID(), document, kit, middleOf(view, size, isWide)))
  const putAt = (item: ShelfItem, at: PlotPoint) => put(pieceOf(item, crypto.randomUUID(), at, document))

  function remove(pieceIds: readonly string[]) {
    const pieces = pieceIds.flatMap((id) => document.pieces[id] ?? []).filter((piece) => !piece.locked)
    const [first] = pieces
    if (!first) {
      setSaid('Locked pieces stay. Unlock them first.')
      return
    }
    const what = pieces.length === 1 ? nameOf(first) : `${pieces.length} pieces`
    if (act([{ type: 'remove', pieceIds: pieces.map((piece) => piece.id) }], `${what} taken off the plot`) !== null)
      return
    choose([])
    showToast(`${what} taken off the plot.`, {
      label: `Put ${what} back`,
      run: () => {
        if (session.act([{ type: 'place', pieces }]) === null) choose(pieces.map((piece) => piece.id))
      },
    })
  }

  const step = (way: 'undo' | 'redo') => {
    const did = way === 'undo' ? session.undo() : session.redo()
    setSaid(did ? (way === 'undo' ? 'Undone' : 'Done again') : 'Nothing left to take back')
  }

  function keyDown(event: KeyboardEvent) {
    if (!(event.ctrlKey || event.metaKey) || event.target instanceof HTMLInputElement) return
    const key = event.key.toLowerCase()
    if (key !== 'z' && key !== 'y') return
    event.preventDefault()
    if (mayEdit) step(key === 'y' || event.shiftKey ? 'redo' : 'undo')
  }

  const drag = useShelfDrag({
    onDrop: (item, at) => putAt(item, toPlot(view, at)),
    onPickUp: () => setArmed(null),
  })
  const [onlyId] = chosen
  const only = chosen.size === 1 && onlyId !== undefined ? document.pieces[onlyId] : undefined
  const note = only ? (
    <PieceNote key={only.id} parts={parts} piece={only} onRemove={() => remove([only.id])} />
  ) : (
    chosen.size > 1 && <ManyNote count={chosen.size} mayEdit={mayEdit} onRemove={() => remove([...chosen])} />
  )

  return (
    <DndContext id="plot-shelf" {...drag.context}>
      <div className="flex flex-col gap-3" onKeyDown={keyDown}>
        <EditorBar
          state={state}
          mayEdit={mayEdit}
          isSnapping={isSnapping}
          onSnapping={setIsSnapping}
          isList={isList}
          onList={setIsList}
          onUndo={() => step('undo')}
          onRedo={() => step('redo')}
          onZoom={zoom}
          onFitKit={() => fit(kitBounds(document, kit))}
          onFitPieces={() => fit(piecesBounds(document, kit))}
          onFitStage={() => fit(stageBounds(document))}
          stage={document.stage}
          units={units}
          onStage={(stage) => act([{ type: 'setStage', stage }], 'Stage resized')}
        />
        <PlotNotices state={state} session={session} nameOf={nameOf} />
        {/* On a phone the sheet stays in sight above the note and the shelf, so that a finger can drag from one to the other. */}
        <div className={classes('grid gap-4', mayEdit && 'lg:grid-cols-[13rem_minmax(0,1fr)]')}>
          {mayEdit && (
            <div className="order-3 lg:order-none lg:max-h-[max(26rem,calc(100dvh-20.5rem))] lg:overflow-y-auto lg:pr-1">
              <Shelf document={document} kit={kit} units={units} armed={armed} onArm={setArmed} onPlace={putByItself} />
            </div>
          )}
          <div className="contents lg:flex lg:min-w-0 lg:flex-col lg:gap-4">
            {isList ? (
              <PieceList parts={parts} chosen={chosen} onChoose={choose} onRemove={(id) => remove([id])} />
            ) : (
              <Sheet
                parts={parts}
                view={view}
                setView={setView}
                size={size}
                isWide={isWide}
                attach={attach}
                chosen={chosen}
                onChoose={choose}
                isSnapping={isSnapping}
                isArmed={armed !== null}
                onPress={(at) => {
                  if (!armed) return false
                  putAt(armed, at)
                  return true
                }}
                onRemove={() => remove([...chosen])}
                onZoom={zoom}
                onFit={() => fit(kitBounds(document, kit))}
              >
                {isWide && note && (
                  <div
                    className="absolute inset-y-0 right-0 w-72 overflow-y-auto bg-paper px-4 py-3"
                    onKeyDown={(event) => event.stopPropagation()}
                  >
                    {note}
                  </div>
                )}
              </Sheet>
            )}
            {(isList || !isWide) && note && <div className="order-2">{note}</div>}
          </div>
        </div>
        <LiveRegion>{said}</LiveRegion>
      </div>
      <DragOverlay dropAnimation={null}>
        {drag.inHand && <PieceInHand item={drag.inHand} kit={kit} pxPerM={view.pxPerM} />}
      </DragOverlay>
    </DndContext>
  )
}
