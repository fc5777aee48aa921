'use client'

import { useDraggable } from '@dnd-kit/core'
import { useState } from 'react'
import { flushSync } from 'react-dom'
import { classes } from '@/components/ui/classes'
import { Field } from '@/components/ui/field'
import { TextInput } from '@/components/ui/text-input'
import type { PlotDocument } from '../model/document'
import type { KitById } from '../model/kit-piece'
import type { LengthUnits } from '../symbols/length-words'
import { shelfFromKit, shelfOfKinds, type ShelfItem } from '../tools/shelf'

export interface ShelfProps {
  document: PlotDocument
  kit: KitById
  units: LengthUnits
  /** What is in hand, waiting for a press on the plot. */
  armed: ShelfItem | null
  onArm: (item: ShelfItem | null) => void
  onPlace: (item: ShelfItem) => void
}

/** What the kit holds and the plot does not yet, then every other piece. */
export function Shelf({ document, kit, units, armed, onArm, onPlace }: ShelfProps) {
  const [query, setQuery] = useState('')
  const fromKit = shelfFromKit(document, kit)
  const others = shelfOfKinds(query, units)
  const list = (items: readonly ShelfItem[]) => (
    <ul>
      {items.map((item) => (
        <ShelfLine key={item.key} item={item} isArmed={armed?.key === item.key} onArm={onArm} onPlace={onPlace} />
      ))}
    </ul>
  )
  return (
    <div className="flex flex-col gap-6">
      <section aria-labelledby="shelf-kit">
        <h2 id="shelf-kit" className="mb-1 text-lg">
          Not on the plot yet
        </h2>
        {fromKit.length > 0 ? (
          list(fromKit)
        ) : (
          <p className="text-sm text-soft">
            {kit.size > 0
              ? 'Everything in the kit is on the plot.'
              : 'The kit is empty. Add drums on the Kit page; they then wait here.'}
          </p>
        )}
      </section>
      <section aria-labelledby="shelf-others">
        <h2 id="shelf-others" className="mb-1 text-lg">
          Other pieces
        </h2>
        <Field label={<span className="sr-only">Find by name or size</span>} className="mb-1">
          {(control) => (
            <TextInput
              {...control}
              type="search"
              placeholder="Find by name or size"
              value={query}
              onChange={(event) => setQuery(event.currentTarget.value)}
            />
          )}
        </Field>
        {others.length > 0 ? (
          list(others)
        ) : (
          <p className="text-sm text-soft">No piece is called that. Try “riser” or “0.6”.</p>
        )}
      </section>
    </div>
  )
}

/** The last one of an entry leaves the shelf when it is placed; the focus then goes to its neighbour, not to the page. */
function placeKeepingFocus(pressed: HTMLButtonElement, place: () => void) {
  const line = pressed.closest('li')
  const neighbour = (line?.nextElementSibling ?? line?.previousElementSibling)?.querySelector('button')
  flushSync(place)
  if (!pressed.isConnected) neighbour?.focus()
}

function ShelfLine({
  item,
  isArmed,
  onArm,
  onPlace,
}: {
  item: ShelfItem
  isArmed: boolean
  onArm: ShelfProps['onArm']
  onPlace: ShelfProps['onPlace']
}) {
  const { setNodeRef, listeners, attributes, isDragging } = useDraggable({ id: item.key, data: { item } })
  const onKeyDown = listeners?.['onKeyDown'] as ((event: React.KeyboardEvent) => void) | undefined
  return (
    <li className="border-b border-line">
      <button
        type="button"
        ref={setNodeRef}
        {...listeners}
        aria-describedby={attributes['aria-describedby']}
        aria-roledescription={attributes['aria-roledescription']}
        aria-pressed={isArmed}
        onKeyDown={(event) => {
          if (event.key === 'Enter') {
            event.preventDefault()
            placeKeepingFocus(event.currentTarget, () => onPlace(item))
          } else onKeyDown?.(event)
        }}
        onClick={() => onArm(isArmed ? null : item)}
        className={classes(
          'flex min-h-control w-full touch-manipulation items-baseline justify-between gap-3 px-1 py-1.5 text-left text-[0.9375rem]',
          isArmed ? 'bg-ink text-paper' : 'hover:bg-wash',
          isDragging && 'opacity-50',
        )}
      >
        <span>{item.name}</span>
        <span className={classes('figures shrink-0 text-sm', isArmed ? 'text-paper' : 'text-soft')}>{item.hint}</span>
      </button>
      {isArmed && (
        <p className="flex flex-wrap items-baseline gap-2 px-1 py-1 text-sm">
          Press the plot where it goes, or
          <button
            type="button"
            className="min-h-7 font-bold underline underline-offset-4"
            onClick={() => onPlace(item)}
          >
            put it on free ground
          </button>
        </p>
      )}
    </li>
  )
}
