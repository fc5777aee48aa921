import { clockPoint } from './clock-point'
import { round } from './round'
import type { TraceLug, TraceMove } from './trace-lug'

export interface TraceRodProps {
  lug: TraceLug
  hoopRadius: number
  /** To be read now: its number is ringed. */
  now?: boolean
  /** One of many side by side: a larger number and no word. */
  small?: boolean
  /** Which way this rod is to be turned now, if it is. */
  move: TraceMove['turn'] | null
}

/** What stands beside a lug's number: a word for a lug that is out, nothing for one that is even. */
function lugWord(lug: TraceLug): string | null {
  if (lug.offset === null || !lug.out) return null
  return lug.offset > 0 ? 'high' : 'low'
}

/**
 * One claw with its rod and number. Filled: read. Hollow: not read yet. A wedge pointing out (high) or in (low),
 * with the word: out of tolerance. A key on the rod: turn it now, the way its arrow goes.
 */
export function TraceRod({ lug, hoopRadius, now, small, move }: TraceRodProps) {
  const word = lugWord(lug)
  const turnDeg = round((lug.angleRad * 180) / Math.PI)
  const label = clockPoint(lug.angleRad, move ? 116 : word ? 106 : 94)
  return (
    <g data-lug={lug.number} data-out={lug.out || undefined}>
      <g transform={`rotate(${turnDeg})`} className={word || move ? 'text-spike' : 'text-ink'}>
        <rect x={-2} y={-hoopRadius - 12} width={4} height={7} fill="currentColor" />
        <rect
          x={-5}
          y={-hoopRadius - 5}
          width={10}
          height={9}
          strokeWidth={1.6}
          stroke="currentColor"
          className={lug.offset === null ? 'fill-paper' : 'fill-current'}
        />
        {word && !move && (
          <path
            d={`M0 ${-hoopRadius - (word === 'high' ? 24 : 15)}l6 ${word === 'high' ? 8 : -8}h-12Z`}
            fill="currentColor"
          />
        )}
        {move && <Key turn={move} y={-hoopRadius - 12} />}
      </g>
      {now && <circle cx={label.x} cy={label.y} r={9.5} strokeWidth={1.8} className="fill-none stroke-spike" />}
      <text
        x={label.x}
        y={round(label.y + (small ? 5 : 3.5))}
        textAnchor="middle"
        fontSize={small ? 14 : 10}
        className={word || move || now ? 'figures fill-spike-text font-bold' : 'figures fill-soft'}
      >
        {lug.number}
      </text>
      {word && !small && (
        <text
          x={label.x}
          y={round(label.y + (label.y < -20 ? -7 : 13) + (now ? (label.y < -20 ? -5 : 5) : 0))}
          textAnchor="middle"
          fontSize={8.5}
          className="fill-spike-text font-bold"
        >
          {word}
        </text>
      )}
    </g>
  )
}

/** A drum key on its rod, with an arrow the way it is to be turned: clockwise tightens. */
function Key({ turn, y }: { turn: TraceMove['turn']; y: number }) {
  const clockwise = turn === 'tighten'
  const side = clockwise ? 1 : -1
  return (
    <g>
      <rect x={-2.5} y={y - 9} width={5} height={10} fill="currentColor" />
      <rect x={-11} y={y - 12} width={22} height={3.5} fill="currentColor" />
      <path
        d={`M${-8 * side} ${y - 16}Q0 ${y - 22} ${8 * side} ${y - 16}`}
        fill="none"
        stroke="currentColor"
        strokeWidth={1.4}
      />
      <path d={`M${10.5 * side} ${y - 13.5}l${-6 * side} -1l${3.5 * side} -4Z`} fill="currentColor" />
    </g>
  )
}
