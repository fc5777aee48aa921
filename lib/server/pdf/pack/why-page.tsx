import { View } from '@react-pdf/renderer'
import { explainDrumTuning } from '@/lib/acoustics/explain-drum-tuning'
import type { DrumExplanation } from '@/lib/acoustics/explain-drum-tuning'
import type { ExplainedFigure } from '@/lib/acoustics/explained-figure'
import { figureWords } from '@/lib/acoustics/figure-words'
import { planningCaution } from '@/lib/advance/cautions'
import type { PackDocument } from '@/lib/advance/pack-document'
import { headSideWords } from '@/lib/advance/sheet-words'
import type { TuningSheet } from '@/lib/advance/tuning-sheet'
import { ink } from '../ink'
import { mm } from '../paper-measure'
import { Figures, Heading, Plain } from '../words'
import { PageFrame } from './page-frame'

/** Where the sheets' figures come from: each formula once with its source, then every drum's figures and what went into them. */
export function WhyPage({ pack, sheets }: { pack: PackDocument; sheets: readonly TuningSheet[] }) {
  const drums = sheets.flatMap(({ entryId, name, workedFrom }) =>
    workedFrom ? [{ entryId, name, explanation: explainDrumTuning(workedFrom) }] : [],
  )
  return (
    <PageFrame pack={pack} title="Why these numbers">
      <Heading size={22}>Why these numbers</Heading>
      <Plain style={{ marginTop: mm(1) }}>
        Every figure on the sheets is an estimate. A drum has one note: both heads and the air between them swing
        together. A tap beside a lug is another shape of one head, and air weighs less on it: it lies near 1.7 or 1.8
        times the note, not at the 1.593 of a bare membrane. Bounds are the scatter of real heads against the model and
        of film against its nominal thickness. A measured pitch is worth more than any of them.
      </Plain>
      <View style={{ marginTop: mm(2), borderTop: `0.75pt solid ${ink.ink}` }}>
        {formulas(drums.map(({ explanation }) => explanation)).map((figure) => (
          <Formula key={`${figure.id} ${figure.formula}`} figure={figure} />
        ))}
      </View>
      {drums.map(({ entryId, name, explanation }) => (
        <View key={entryId} wrap={false} style={{ marginTop: mm(2.5) }}>
          <Heading size={11}>{name}</Heading>
          <Line figures={explanation.drum} />
          {explanation.heads.map(({ side, figures }) => (
            <Line key={side} title={headSideWords[side]} figures={figures} />
          ))}
        </View>
      ))}
      <Plain size={7.5} colour="soft" style={{ marginTop: mm(2) }}>
        {planningCaution}
      </Plain>
    </PageFrame>
  )
}

/** Each formula once, in the order in which the drums use them, those of two heads first. */
function formulas(explanations: readonly DrumExplanation[]): ExplainedFigure[] {
  const fullestFirst = [...explanations].sort((a, b) => b.heads.length - a.heads.length)
  const all = fullestFirst.flatMap(({ drum, heads }) => [...drum, ...heads.flatMap(({ figures }) => figures)])
  return [...new Map(all.map((figure) => [`${figure.id} ${figure.formula} ${figure.mark}`, figure])).values()]
}

function Formula({ figure: { label, formula, mark, source, inputs } }: { figure: ExplainedFigure }) {
  return (
    <View
      wrap={false}
      style={{ flexDirection: 'row', borderBottom: `0.4pt solid ${ink.line}`, paddingVertical: mm(0.5) }}
    >
      <View style={{ width: '24%', paddingRight: mm(2) }}>
        <Plain size={7.5} bold>
          {label}
        </Plain>
        <Plain size={7} colour="soft">
          {mark}
        </Plain>
      </View>
      <View style={{ width: '36%', paddingRight: mm(2) }}>
        <Figures size={7}>{formula}</Figures>
      </View>
      <View style={{ width: '40%' }}>
        <Plain size={7}>{source}</Plain>
        <Plain size={7} colour="soft">
          {inputs.map((input) => `${input.symbol} ${uncapped(input.label)}`).join(', ')}
        </Plain>
      </View>
    </View>
  )
}

/** A label in the midst of a line: "First zero of J0" becomes "first zero of J0". */
function uncapped(label: string): string {
  return label.slice(0, 1).toLowerCase() + label.slice(1)
}

/** A drum's or a head's figures in a run: symbol, value, bounds. */
function Line({ title, figures }: { title?: string; figures: readonly ExplainedFigure[] }) {
  return (
    <Plain size={7.5}>
      {[
        ...(title ? [`${title}: `] : []),
        figures
          .map(({ symbol, label, value, unit, bounds }) => {
            const range = bounds ? ` (${figureWords(bounds.low, unit)} to ${figureWords(bounds.high, unit)})` : ''
            return `${uncapped(label)} ${symbol} = ${figureWords(value, unit)}${range}`
          })
          .join('; '),
      ].join('')}
      .
    </Plain>
  )
}
