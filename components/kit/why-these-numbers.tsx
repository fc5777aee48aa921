import { tuningCautions } from '@/lib/advance/cautions'
import { explainHeadEstimate } from '@/lib/acoustics/explain-head-estimate'
import type { ExplainedFigure } from '@/lib/acoustics/explain-head-estimate'
import type { DrumEstimate, SideEstimate } from '@/lib/tuning/drum-estimate'
import { figureWords } from './figure-words'

/** Every figure of a drum with its formula, what went in, how far it can be trusted and where it comes from. */
export function WhyTheseNumbers({ name, estimate, ported }: { name: string; estimate: DrumEstimate; ported: boolean }) {
  const heads = [estimate.batter, ported ? null : estimate.resonant].filter(
    (head): head is SideEstimate => head?.estimate != null,
  )
  const [filmAndRods] = tuningCautions
  return (
    <details className="mt-2">
      <summary className="min-h-7 w-fit text-sm font-bold underline underline-offset-4">
        Why these numbers<span className="sr-only"> for {name}</span>
      </summary>
      <div className="mt-2 border-l-4 border-line pl-4">
        <p className="max-w-prose text-sm">
          These are estimates of each head by itself in the open air. The air inside the shell and the pull of the other
          head are not in the model yet: on a real shell the note of a head lies from 1 % under to 11 % over the figure,
          which is why tap and tension stand with their bounds. A measured pitch is worth more than any of them.
        </p>
        {heads.map((head) => (
          <section key={head.side} className="mt-3">
            <h4 className="name text-base">{head.side === 'batter' ? 'Batter head' : 'Resonant head'}</h4>
            <dl className="mt-1 grid gap-x-6 gap-y-3 sm:grid-cols-2 xl:grid-cols-3">
              {explainHeadEstimate(head.input).map((figure) => (
                <Figure key={figure.id} figure={figure} />
              ))}
            </dl>
          </section>
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

function Figure({ figure }: { figure: ExplainedFigure }) {
  return (
    <div className="min-w-0 border-t border-line pt-1 text-sm">
      <dt className="flex flex-wrap items-baseline justify-between gap-x-3">
        <span>
          {figure.label} <span className="text-soft">({figure.mark})</span>
        </span>
        <span className="figures font-bold">{figureWords(figure.value, figure.unit)}</span>
      </dt>
      <dd>
        <p className="figures break-words">{figure.formula}</p>
        <p className="figures text-soft">
          {figure.inputs.map(({ symbol, value, unit }) => `${symbol} = ${figureWords(value, unit)}`).join(', ')}
        </p>
        <p className="text-soft">{figure.source}</p>
      </dd>
    </div>
  )
}
