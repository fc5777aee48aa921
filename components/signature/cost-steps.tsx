import { classes } from '@/components/ui/classes'
import { scalePercent } from './range-bar'
import type { RangeScale } from './range-bar'
import { round } from './round'

export interface CostStep {
  /** The middle of the step on the scale; a step is one wide. */
  at: number
  /** What this choice costs as a part of the dearest shown, 0 to 1. */
  share: number
  /** Whether no choice costs less. */
  best: boolean
}

export interface CostStepsProps {
  scale: RangeScale
  steps: readonly CostStep[]
  /** Where the note lies now. */
  at: number | null
}

/** Lower than this nothing would be seen of a step. */
const leastHeight = 0.15

/** What each choice along a range costs: the higher the step the dearer, the best marked, the present one filled. */
export function CostSteps({ scale, steps, at }: CostStepsProps) {
  return (
    <div aria-hidden className="absolute inset-0" data-part="costs">
      {steps.map((step) => {
        const left = scalePercent(scale, step.at - 0.5)
        return (
          <span
            key={step.at}
            className={classes(
              'absolute bottom-0 border-x border-t',
              at !== null && Math.abs(step.at - at) < 0.5
                ? 'border-ink bg-ink'
                : step.best
                  ? 'border-reed bg-reed/60'
                  : 'border-paper bg-soft/45',
            )}
            style={{
              left: `${left}%`,
              width: `${round(scalePercent(scale, step.at + 0.5) - left)}%`,
              height: `${round(Math.max(step.share, leastHeight) * 100)}%`,
            }}
          />
        )
      })}
    </div>
  )
}
