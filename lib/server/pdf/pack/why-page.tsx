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
        times the note, not at the 1.593 of a head without air. Bounds are the scatter of real heads against the model
        and of film against its nominal thickness. A measured pitch is worth more than any of them.
      </Plain>
      <View style={{ marginTop: mm(2), borderTop: `0.75pt solid ${ink.ink}` }}>
        {formulas(drums).map(({ key, figure, names }) => (
          <Formula
            key={key}
            figure={figure}
            drums={whichDrums(
              drums.map(({ name }) => name),
              names,
            )}
          />
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

interface ExplainedDrum {
  readonly name: string
  readonly explanation: DrumExplanation
}

interface UsedFormula {
  readonly key: string
  readonly figure: ExplainedFigure
  /** The drums whose figures come from it. */
  readonly names: readonly string[]
}

/** Each formula once, in the order in which the drums use them, those of two heads first. */
function formulas(drums: readonly ExplainedDrum[]): UsedFormula[] {
  const fullestFirst = [...drums].sort((a, b) => b.explanation.heads.length - a.explanation.heads.length)
  const used = new Map<string, UsedFormula>()
  for (const { name, explanation } of fullestFirst) {
    const figures = [...explanation.drum, ...explanation.heads.flatMap((head) => head.figures)]
    for (const figure of figures) {
      const key = `${figure.id} ${figure.formula} ${figure.mark}`
      const names = used.get(key)?.names ?? []
      used.set(key, { key, figure, names: names.includes(name) ? names : [...names, name] })
    }
  }
  return [...used.values()]
}

/** Which of all drums are meant, the shorter way: "Tom 12", "all but Kick 22"; null: every one. */
function whichDrums(all: readonly string[], names: readonly string[]): string | null {
  const others = all.filter((name) => !names.includes(name))
  if (others.length === 0) return null
  return others.length < names.length ? `all but ${others.join(', ')}` : names.join(', ')
}

/** A formula with its mark and source, and the drums it is for where it is not for all. */
function Formula({ figure, drums }: { figure: ExplainedFigure; drums: string | null }) {
  const { label, formula, mark, source, inputs } = figure
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
          {drums ? `${mark}; ${drums}` : mark}
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
