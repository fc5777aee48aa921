import { View } from '@react-pdf/renderer'
import type { ReactNode } from 'react'
import type { PackDocument, PackLine } from '@/lib/advance/pack-document'
import { ink } from '../ink'
import { mm } from '../paper-measure'
import { Figures, Heading, Plain } from '../words'
import { Cautions } from './cautions'
import { PageFrame } from './page-frame'
import { RuledTable } from './ruled-table'

/** The numbered lines with tick boxes: a filled and photographed page is an answer too. The last page holds the cautions. */
export function LinePage({ pack, last }: { pack: PackDocument; last: boolean }) {
  const asked = pack.lines.filter((line) => line.asked).length
  return (
    <PageFrame pack={pack} title="Lines">
      <View style={{ marginBottom: mm(2) }}>
        <Plain>
          {pack.audience === 'venue'
            ? `${asked} of ${pack.lines.length} lines are asked of you; the others come from elsewhere and stand here so that you know of them. Numbers are the same for everybody.`
            : `${asked} lines, for each of the shows on the cover. Numbers are the same for everybody, so some may be left out here.`}
        </Plain>
      </View>
      <RuledTable
        columns={[
          { head: 'No.', widthMm: 9, align: 'right' },
          { head: 'Asked for', widthMm: null },
          { head: 'As asked', widthMm: 12, align: 'center' },
          { head: 'Instead', widthMm: 12, align: 'center' },
          { head: 'Not yet', widthMm: 12, align: 'center' },
          { head: 'Can’t', widthMm: 12, align: 'center' },
          { head: 'What instead, or by which date', widthMm: 40 },
        ]}
        rows={pack.lines.map((line) => ({ key: line.lineId, cells: cells(line) }))}
      />
      <View wrap={false} style={{ marginTop: mm(6), flexDirection: 'row', alignItems: 'center' }}>
        <TickBox />
        <View style={{ marginLeft: mm(2), marginRight: mm(6) }}>
          <Heading size={11}>That’s all from us</Heading>
        </View>
        <Blank label="Name" widthMm={55} />
        <Blank label="Date" widthMm={35} />
      </View>
      {last && (
        <View style={{ marginTop: mm(10) }}>
          <Cautions pack={pack} />
        </View>
      )}
    </PageFrame>
  )
}

function cells(line: PackLine): ReactNode[] {
  const boxes = line.asked
    ? ['as asked', 'instead', 'not yet', 'can’t'].map((answer) => (
        <TickBox key={answer} of={line.count > 1 ? line.count : null} />
      ))
    : [null, null, null, null]
  return [
    <Figures key="number" bold size={11}>
      {String(line.number)}
    </Figures>,
    <View key="words">
      <Plain bold>{line.words}</Plain>
      {line.details.map((detail, index) => (
        <Plain key={index} size={8}>
          {detail}
        </Plain>
      ))}
      {line.insteadOf && <Plain size={8}>{`fine too: ${line.insteadOf}`}</Plain>}
    </View>,
    ...boxes,
    line.asked ? null : (
      <Plain key="by" size={8}>
        {`brought by ${line.broughtBy}`}
      </Plain>
    ),
  ]
}

/** A box to tick, or to write how many of a counted line. */
function TickBox({ of = null }: { of?: number | null }) {
  return (
    <View style={{ alignItems: 'center' }}>
      <View style={{ width: mm(5), height: mm(5), border: `0.75pt solid ${ink.ink}` }} />
      {of !== null && <Figures size={7}>{`of ${of}`}</Figures>}
    </View>
  )
}

function Blank({ label, widthMm }: { label: string; widthMm: number }) {
  return (
    <View style={{ width: mm(widthMm), marginRight: mm(4) }}>
      <View style={{ height: mm(6), borderBottom: `0.5pt solid ${ink.ink}` }} />
      <Plain size={7.5} colour="soft">
        {label}
      </Plain>
    </View>
  )
}
