import { Circle, G, Line, Polygon, Svg, Text } from '@react-pdf/renderer'
import type { SheetHead } from '@/lib/advance/tuning-sheet'
import { ink, strokeMm } from '../ink'
import { mm } from '../paper-measure'
import { families } from '../register-fonts'

const hoopShare = 0.7
const numberShare = 0.87
const textSize = 9
/** At the top edge, over the numbers: those of twelve lugs leave no room beside them. */
const badgeWord = { size: 6.5, baseline: 5.5 }

/**
 * A head as its tuner faces it: badge at the top, lug numbers outside the hoop, and lines across it from each lug to the next
 * in the order, the first with an arrow.
 */
export function LugDrawing({ head, sizeMm }: { head: SheetHead; sizeMm: number }) {
  const middle = mm(sizeMm) / 2
  const hoop = middle * hoopShare
  const at = (lug: { x: number; y: number }, radius: number) => ({
    x: middle + lug.x * radius,
    y: middle + lug.y * radius,
  })
  const inOrder = [...head.lugs].sort((a, b) => a.turn - b.turn)
  const stroke = { stroke: ink.ink, strokeWidth: mm(strokeMm.fine) }
  return (
    <Svg width={mm(sizeMm)} height={mm(sizeMm)}>
      {inOrder.slice(1).map((lug, index) => {
        const before = inOrder[index] ?? lug
        const from = at(before, hoop * 0.86)
        const to = at(lug, hoop * 0.86)
        return (
          <G key={lug.lug}>
            <Line
              {...{ x1: from.x, y1: from.y, x2: to.x, y2: to.y }}
              stroke={index === 0 ? ink.ink : ink.soft}
              strokeWidth={mm(index === 0 ? strokeMm.bold : strokeMm.hair)}
              {...(index === 0 ? {} : { strokeDasharray: '3 2' })}
            />
            {index === 0 && <Polygon points={arrowHead(from, to)} fill={ink.ink} />}
          </G>
        )
      })}
      <Circle cx={middle} cy={middle} r={hoop} fill="none" stroke={ink.ink} strokeWidth={mm(strokeMm.bold)} />
      <Circle cx={middle} cy={middle} r={hoop * 0.94} fill="none" {...stroke} />
      {head.lugs.map((lug) => {
        const inner = at(lug, hoop)
        const outer = at(lug, hoop * 1.07)
        const number = at(lug, middle * numberShare)
        return (
          <G key={lug.lug}>
            <Line {...{ x1: inner.x, y1: inner.y, x2: outer.x, y2: outer.y }} stroke={ink.ink} strokeWidth={mm(0.9)} />
            <Text
              x={number.x}
              y={number.y + textSize * 0.35}
              textAnchor="middle"
              fill={ink.ink}
              {...{ fontFamily: families.figures, fontSize: textSize, fontWeight: 700 }}
            >
              {String(lug.lug)}
            </Text>
          </G>
        )
      })}
      <Polygon
        points={[
          [middle - 7, middle - hoop * 1.14],
          [middle + 7, middle - hoop * 1.14],
          [middle + 4, middle - hoop * 1.01],
          [middle - 4, middle - hoop * 1.01],
        ]
          .map((point) => point.join(','))
          .join(' ')}
        fill={ink.ink}
      />
      <Text
        x={middle}
        y={badgeWord.baseline}
        textAnchor="middle"
        fill={ink.ink}
        {...{ fontFamily: families.text, fontSize: badgeWord.size, fontWeight: 400 }}
      >
        badge
      </Text>
    </Svg>
  )
}

function arrowHead(from: { x: number; y: number }, to: { x: number; y: number }): string {
  const length = Math.hypot(to.x - from.x, to.y - from.y) || 1
  const [ux, uy] = [(to.x - from.x) / length, (to.y - from.y) / length]
  const [long, wide] = [8, 3]
  const base = { x: to.x - ux * long, y: to.y - uy * long }
  return [to, { x: base.x - uy * wide, y: base.y + ux * wide }, { x: base.x + uy * wide, y: base.y - ux * wide }]
    .map(({ x, y }) => `${x},${y}`)
    .join(' ')
}
