import { View } from '@react-pdf/renderer'
import type { SheetHead } from '@/lib/advance/tuning-sheet'
import { ink } from '../ink'
import { mm } from '../paper-measure'
import { Figures, Heading, Plain } from '../words'
import { LugDrawing } from './lug-drawing'

const drawingMm = 40
/** A row's height and, over thirteen of them, the room of a table: fewer lugs have taller rows, easier to write in. */
const rowMm = { least: 5.8, most: 8.5 }
const blankColumns = ['gauge', 'tap Hz', 'gauge', 'tap Hz'] as const

/** One head of a drum: its tap largest, then the gauge to start from, the drawn order, and room for readings. */
export function HeadColumn({ head }: { head: SheetHead }) {
  return (
    <View>
      <View style={{ borderBottom: `0.75pt solid ${ink.ink}`, paddingBottom: 1, marginBottom: 2 }}>
        <Heading size={12}>{head.side === 'batter' ? 'Batter head' : 'Resonant head'}</Heading>
        <Plain size={8}>{head.words}</Plain>
      </View>
      <View style={{ flexDirection: 'row' }}>
        <View style={{ flex: 1 }}>
          {head.tap && (
            <>
              <Plain size={8} colour="soft">
                tap beside a lug, other head damped
              </Plain>
              <Figures bold size={21} style={{ lineHeight: 1.05 }}>{`${head.tap.hz.toFixed(1)} Hz`}</Figures>
              <Figures
                size={7.5}
              >{`${head.tap.lowHz.toFixed(0)} to ${head.tap.highHz.toFixed(0)}, near ${head.tap.name}`}</Figures>
            </>
          )}
          <View style={{ marginTop: mm(1.5) }}>
            <Plain size={8} colour="soft">
              gauge to start from
            </Plain>
            <Figures bold size={13} style={{ lineHeight: 1.1 }}>
              {head.gauge === null ? '–' : String(head.gauge)}
            </Figures>
            <Plain size={7.5}>{head.gauge === null ? 'none noted' : 'as noted, relative to this gauge'}</Plain>
          </View>
          {head.tensionNPerM && (
            <Plain
              size={7.5}
              style={{ marginTop: mm(1.5) }}
            >{`film ${thousands(head.tensionNPerM.value)} kN/m, ${thousands(
              head.tensionNPerM.low,
            )} to ${thousands(head.tensionNPerM.high)}`}</Plain>
          )}
          {head.rodPullN !== null && <Plain size={7.5}>{rodWords(head.rodPullN, head.rodPullBoundsN)}</Plain>}
          {head.without && (
            <Plain size={8} style={{ marginTop: mm(1.5) }}>
              {head.without}
            </Plain>
          )}
        </View>
        <LugDrawing head={head} sizeMm={drawingMm} />
      </View>
      <ReadingTable head={head} />
    </View>
  )
}

const thousands = (value: number) => (value / 1000).toFixed(2)
const tens = (value: number) => Math.round(value / 10) * 10

function rodWords(pullN: number, bounds: SheetHead['rodPullBoundsN']): string {
  const about = `about ${tens(pullN)} N on each rod`
  return bounds ? `${about}, ${tens(bounds.low)} to ${tens(bounds.high)}` : about
}

/** Blank columns for two passes, the lugs in the order in which they are turned. */
function ReadingTable({ head }: { head: SheetHead }) {
  const heightMm = Math.min(rowMm.most, (13 * rowMm.least) / (head.order.length + 1))
  const cell = {
    flex: 1,
    borderLeft: `0.4pt solid ${ink.soft}`,
    height: mm(heightMm),
    justifyContent: 'center',
    alignItems: 'center',
  } as const
  return (
    <View style={{ marginTop: mm(1), borderTop: `0.75pt solid ${ink.ink}`, borderRight: `0.4pt solid ${ink.soft}` }}>
      <View style={{ flexDirection: 'row', borderBottom: `0.75pt solid ${ink.ink}` }}>
        <View style={{ ...cell, flex: 0.6 }}>
          <Plain size={7} bold>
            lug
          </Plain>
        </View>
        {blankColumns.map((name, index) => (
          <View key={index} style={cell}>
            <Plain size={7}>{`${index < 2 ? '1st' : '2nd'} ${name}`}</Plain>
          </View>
        ))}
      </View>
      {head.order.map((lug) => (
        <View key={lug} style={{ flexDirection: 'row', borderBottom: `0.4pt solid ${ink.soft}` }}>
          <View style={{ ...cell, flex: 0.6 }}>
            <Figures bold>{String(lug)}</Figures>
          </View>
          {blankColumns.map((_, index) => (
            <View key={index} style={cell} />
          ))}
        </View>
      ))}
    </View>
  )
}
