import { tuningCautions } from '@/lib/advance/cautions'
import type { DrumTuningInput } from '@/lib/acoustics/drum-tuning'
import { explainDrumTuning } from '@/lib/acoustics/explain-drum-tuning'
import type { ExplainedFigure } from '@/lib/acoustics/explained-figure'
import { figureWords } from '@/lib/acoustics/figure-words'

/** Every figure of a drum with its formula, what went in, its bounds, how far it can be trusted and where it comes from. */
export function WhyTheseNumbers({ name, input }: { name: string; input: DrumTuningInput }) {
  const { drum, heads } = explainDrumTuning(input)
  const [filmAndRods] = tuningCautions
  return (
    <details className="mt-2">
      <summary className="min-h-7 w-fit text-sm font-bold underline underline-offset-4">
        Why these numbers<span className="sr-only"> for {name}</span>
      </summary>
      <div className="mt-2 border-l-4 border-line pl-4">
        <p className="max-w-prose text-sm">
          These are estimates. A drum has one note: both heads and the air between them swing together. The tap beside a
          lug is another shape of one head, and air weighs less on it: it lies near 1.7 or 1.8 times the note, not at
          the 1.593 of a head without air. The bounds are the scatter of real heads against the model, and of film
          against its nominal thickness. A ratio measured on this drum replaces the model: write it in the kit.
        </p>
        <Figures title="The drum" figures={drum} />
        {heads.map(({ side, figures }) => (
          <Figures key={side} title={side === 'batter' ? 'Batter head' : 'Resonant head'} figures={figures} />
        ))}
        {filmAndRods && (
          <p className="mt-3 max-w-prose border-l-4 border-brass pl-2 text-sm">
            <strong className="text-brass">{filmAndRods.name}. </strong>
            {filmAndRods.words} Torque for one and the same pull scatters by 30 % or more: never bring a head up by
            torque.
          </p>
        )}
      </div>
    </details>
  )
}

function Figures({ title, figures }: { title: string; figures: readonly ExplainedFigure[] }) {
  return (
    <section className="mt-3">
      <h4 className="name text-base">{title}</h4>
      <dl className="mt-1 grid gap-x-6 gap-y-3 sm:grid-cols-2 xl:grid-cols-3">
        {figures.map((figure) => (
          <Figure key={figure.id} figure={figure} />
        ))}
      </dl>
    </section>
  )
}

function Figure({ figure }: { figure: ExplainedFigure }) {
  const { bounds, unit } = figure
  return (
    <div className="min-w-0 border-t border-line pt-1 text-sm">
      <dt className="flex flex-wrap items-baseline justify-between gap-x-3">
        <span>
          {figure.label} <span className="text-soft">({figure.mark})</span>
        </span>
        <span className="figures font-bold">{figureWords(figure.value, unit)}</span>
      </dt>
      <dd>
        {bounds && (
          <p className="figures text-soft">
            {figureWords(bounds.low, unit)} to {figureWords(bounds.high, unit)}
          </p>
        )}
        <p className="figures break-words">{figure.formula}</p>
        <p className="figures text-soft">
          {figure.inputs.map(({ symbol, value, unit: of }) => `${symbol} = ${figureWords(value, of)}`).join(', ')}
        </p>
        <p className="text-soft">{figure.source}</p>
      </dd>
    </div>
  )
}
