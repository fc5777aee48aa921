'use client'

import { useState } from 'react'
import type { ReplyLine } from '@/lib/contracts/answer'
import { Button } from '../ui/button'
import { Checkbox } from '../ui/checkbox'

/** "All as asked except …": ticks are the exceptions; everything else of what is open is answered in one press. */
export function AllAsAsked({ lines, onAnswer, onClose }: { lines: readonly ReplyLine[]; onAnswer: (lines: readonly ReplyLine[]) => void; onClose: () => void }) {
  const [except, setExcept] = useState<ReadonlySet<string>>(new Set())
  const severalSpecs = new Set(lines.map((line) => line.spec)).size > 1
  const rest = lines.filter((line) => !except.has(line.lineId))
  return (
    <section aria-labelledby="all-as-asked" className="border-2 border-ink bg-sheet p-3">
      <h2 id="all-as-asked" className="text-xl">
        All as asked except…
      </h2>
      <p className="mt-1 text-sm text-soft">Tick what is not as asked. It stays open, to be answered by itself.</p>
      <div className="mt-2">
        {lines.map((line) => (
          <Checkbox
            key={line.lineId}
            label={severalSpecs ? `${line.words}, ${line.spec}` : line.words}
            checked={except.has(line.lineId)}
            onChange={(event) => {
              const next = new Set(except)
              if (event.target.checked) next.add(line.lineId)
              else next.delete(line.lineId)
              setExcept(next)
            }}
          />
        ))}
      </div>
      <div className="mt-2 grid gap-2">
        {rest.length > 0 && (
          <Button kind="primary" onClick={() => onAnswer(rest)}>
            {rest.length === 1 ? 'Answer 1 line as asked' : `Answer ${rest.length} lines as asked`}
          </Button>
        )}
        <Button kind="quiet" onClick={onClose}>
          Answer line by line
        </Button>
      </div>
    </section>
  )
}
