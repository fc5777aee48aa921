import { memo } from 'react'
import type { Piece } from '../model/document'
import type { Scene, SceneItem } from '../render/build-scene'
import { ShapeDrawing } from './shape-drawing'

export interface SceneLayerProps {
  scene: Scene
  /** Pieces by id, to name them. */
  pieces: Readonly<Record<string, Piece>>
  chosen: ReadonlySet<string>
  spoken: (piece: Piece) => string
  onChoose: (pieceId: string, isAdding: boolean) => void
}

/** The drawing. Every piece is a button that the keyboard reaches; its words are drawn above all pieces. */
export const SceneLayer = memo(function SceneLayer({ scene, pieces, chosen, spoken, onChoose }: SceneLayerProps) {
  const { ground, groups, words } = split(scene)
  return (
    <>
      <g aria-hidden>
        {ground.map((item, index) => (
          <ShapeDrawing key={index} item={item} />
        ))}
      </g>
      {groups.map(({ pieceId, items }) => {
        const piece = pieces[pieceId]
        return (
          <g
            key={pieceId}
            role="button"
            tabIndex={0}
            aria-label={piece ? spoken(piece) : undefined}
            aria-pressed={chosen.has(pieceId)}
            data-piece={pieceId}
            className={chosen.has(pieceId) ? 'chosen' : undefined}
            onKeyDown={(event) => {
              if (event.key !== 'Enter' && event.key !== ' ') return
              event.preventDefault()
              onChoose(pieceId, event.shiftKey)
            }}
            onFocus={(event) => {
              if (event.currentTarget.matches(':focus-visible') && !chosen.has(pieceId)) onChoose(pieceId, false)
            }}
          >
            {items.map((item, index) => (
              <ShapeDrawing key={index} item={item} />
            ))}
          </g>
        )
      })}
      <g aria-hidden className="pointer-events-none">
        {words.map((item, index) => (
          <ShapeDrawing key={index} item={item} />
        ))}
      </g>
    </>
  )
})

function split(scene: Scene) {
  const ground: SceneItem[] = []
  const words: SceneItem[] = []
  const groups = new Map<string, SceneItem[]>()
  for (const item of scene.items) {
    if (item.shape === 'text' || item.part === 'leader') words.push(item)
    else if (item.pieceId === null) ground.push(item)
    else groups.set(item.pieceId, [...(groups.get(item.pieceId) ?? []), item])
  }
  // A text piece has no shape of its own to take hold of, so its words stand for it.
  for (const item of scene.items)
    if (item.shape === 'text' && item.pieceId !== null && !groups.has(item.pieceId)) groups.set(item.pieceId, [])
  return { ground, words, groups: [...groups].map(([pieceId, items]) => ({ pieceId, items })) }
}
