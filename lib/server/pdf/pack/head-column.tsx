import { View } from '@react-pdf/renderer'
import { kilonewtons } from '@/lib/acoustics/figure-words'
import { headSideWords, sheetGaugeWords, toleranceWords, warbleLimitWords } from '@/lib/advance/sheet-words'
import type { SheetHead, TuningSheet } from '@/lib/advance/tuning-sheet'
import { ink } from '../ink'
import { mm } from '../paper-measure'
import { Figures, Heading, Plain } from '../words'
import { LugDrawing } from './lug-drawing'

const drawingMm = 40
/** Room above the tables, so that both heads' begin at one height. */
const upperMm = 47
/** A row's height and, over thirteen of them, the room of a table: fewer lugs have taller rows, easier to write in. */
const rowMm = { least: 4.6, most: 8 }
const blankColumns = ['gauge', 'tap Hz', 'gauge', 'tap Hz'] as const

/** One head of a drum: its tap largest, then the gauge to start from, the drawn order, and room for readings. */
export function HeadColumn({ sheet, head }: { sheet: TuningSheet; head: SheetHead }) {
  const { tap, tensionNPerM, rodPullN, rodPullBoundsN } = head
  const gauge = sheetGaugeWords(head.gauge)
  return (
    <View>
      <View style={{ borderBottom: `0.75pt solid ${ink.ink}`, paddingBottom: 1, marginBottom: 2 }}>
        <Heading size={12}>{headSideWords[head.side]}</Heading>
        <Plain size={8}>{head.words}</Plain>
      </View>
      <View style={{ flexDirection: 'row', minHeight: mm(upperMm) }}>
        <View style={{ flex: 1 }}>
          {tap && (
            <>
              <Label>tap beside a lug, other head damped</Label>
              <Figures bold size={21} style={{ lineHeight: 1.05 }}>{`${tap.hz.toFixed(1)} Hz`}</Figures>
              <Figures size={7.5}>{`${tap.lowHz.toFixed(0)} to ${tap.highHz.toFixed(0)}, near ${tap.name}`}</Figures>
            </>
          )}
          <Label>even within</Label>
          <Plain size={8} bold>
            {toleranceWords(sheet, head)}
          </Plain>
          <Plain size={8}>{`warble ${warbleLimitWords(sheet, head.side)}`}</Plain>
          <Label>gauge to start from</Label>
          <View style={{ flexDirection: 'row', alignItems: 'baseline' }}>
            <Figures bold size={13} style={{ lineHeight: 1.1 }}>
              {gauge.reading}
            </Figures>
            {gauge.bounds && (
              <Figures size={7.5} style={{ marginLeft: mm(1.5) }}>
                {gauge.bounds}
              </Figures>
            )}
          </View>
          <Plain size={7.5}>{gauge.worth}</Plain>
          {tensionNPerM && (
            <Plain size={7.5} style={{ marginTop: mm(1) }}>
              {`film ${kilonewtons(tensionNPerM.value)} kN/m, ${kilonewtons(tensionNPerM.low)} to ${kilonewtons(tensionNPerM.high)}`}
            </Plain>
          )}
          {rodPullN !== null && <Plain size={7.5}>{rodWords(rodPullN, rodPullBoundsN)}</Plain>}
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

function Label({ children }: { children: string }) {
  return (
    <Plain size={8} colour="soft" style={{ marginTop: mm(1) }}>
      {children}
    </Plain>
  )
}

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
