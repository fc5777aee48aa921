import { View } from '@react-pdf/renderer'
import { planningCaution, tuningCautions } from '@/lib/advance/cautions'
import type { PackDocument } from '@/lib/advance/pack-document'
import { figureLine, openHeadWords, sheetCautionWords, sheetNoteWords } from '@/lib/advance/sheet-words'
import { lugOneRule, tapProtocol, tuningSteps } from '@/lib/advance/tuning-method'
import type { TuningSheet } from '@/lib/advance/tuning-sheet'
import { ink } from '../ink'
import { mm } from '../paper-measure'
import { Figures, Heading, Plain } from '../words'
import { HeadColumn } from './head-column'
import { LinkCode } from './link-code'
import { PageFrame } from './page-frame'

/** One drum's sheet: what to bring each head to, in which order, with blank columns for the readings. */
export function SheetPage({
  pack,
  sheet,
  benchLink,
}: {
  pack: PackDocument
  sheet: TuningSheet
  benchLink: string | null
}) {
  const [batter] = sheet.heads
  const warnings = sheet.heads.flatMap((head) =>
    head.cautions.map((caution) => `${head.side}: ${sheetCautionWords[caution]}`),
  )
  return (
    <PageFrame pack={pack} title={`Tuning sheet, ${sheet.name}`}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between' }}>
        <View style={{ flex: 1, paddingRight: mm(4) }}>
          <Heading size={22}>{sheet.name}</Heading>
          <DrumNote note={sheet.note} />
          <Plain>
            {[
              `${sheet.roleWord}, ${sheet.sizeWords}`,
              ...(sheet.relationWords ? [sheet.relationWords] : []),
              ...(sheet.muffling === '' ? [] : [`muffling: ${sheet.muffling}`]),
            ].join('; ')}
          </Plain>
          {batter && <Plain>{`Lug order: ${batter.order.join(', ')}. ${lugOneRule}`}</Plain>}
          {warnings.map((warning) => (
            <Plain key={warning} bold>
              {warning}
            </Plain>
          ))}
        </View>
        <LinkCode link={benchLink} words="Tune with the phone" sizeMm={27} />
      </View>
      <View style={{ flexDirection: 'row', marginTop: mm(2) }}>
        {sheet.heads.map((head) => (
          <View
            key={head.side}
            style={{ flex: 1, paddingRight: head.side === 'batter' && sheet.heads.length > 1 ? mm(6) : 0 }}
          >
            <HeadColumn sheet={sheet} head={head} />
          </View>
        ))}
        {sheet.heads.length === 1 && <View style={{ flex: 1 }} />}
      </View>
      <Plain size={8} style={{ marginTop: mm(2) }}>
        {['How to tap.', tapProtocol, sheet.figures && openHeadWords(sheet.figures)].filter(Boolean).join(' ')}
      </Plain>
      <View
        style={{
          flexDirection: 'row',
          flexWrap: 'wrap',
          marginTop: mm(2.5),
          borderTop: `0.75pt solid ${ink.ink}`,
          paddingTop: 2,
        }}
      >
        {tuningSteps.map(({ name, words }, index) => (
          <View
            key={name}
            wrap={false}
            style={{ width: '50%', paddingRight: mm(4), paddingBottom: 1.5, flexDirection: 'row' }}
          >
            <Plain size={8} bold style={{ width: mm(4.5) }}>
              {String(index + 1)}
            </Plain>
            <View style={{ flex: 1 }}>
              <Plain size={8}>{`${name}. ${words}`}</Plain>
            </View>
          </View>
        ))}
      </View>
      <View style={{ marginTop: mm(1) }}>
        {tuningCautions.map(({ name, words }) => (
          <Plain key={name} size={7.5}>{`${name}: ${words}`}</Plain>
        ))}
        <Plain size={7.5} colour="soft">
          {[...(sheet.figures ? [`${figureLine(sheet.figures)}.`] : []), planningCaution].join(' ')}
        </Plain>
      </View>
      <View style={{ flexDirection: 'row', marginTop: mm(1) }}>
        {['Tuned and signed off by', 'Date and time', 'Remarks'].map((label, index) => (
          <View key={label} style={{ flex: index === 2 ? 2 : 1, marginRight: mm(4) }}>
            <View style={{ height: mm(6), borderBottom: `0.5pt solid ${ink.ink}` }} />
            <Plain size={7} colour="soft">
              {label}
            </Plain>
          </View>
        ))}
      </View>
    </PageFrame>
  )
}

/** The drum's one note, largest on the page. */
function DrumNote({ note }: { note: TuningSheet['note'] }) {
  if (!note) return <Heading size={13}>No note set</Heading>
  return (
    <View style={{ flexDirection: 'row', alignItems: 'baseline', marginBottom: mm(0.8) }}>
      <Figures bold size={24} style={{ lineHeight: 1.05, marginRight: mm(3) }}>{`${note.hz.toFixed(1)} Hz`}</Figures>
      <Heading size={13}>{sheetNoteWords(note)}</Heading>
    </View>
  )
}
