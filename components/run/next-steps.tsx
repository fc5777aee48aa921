import type { Route } from 'next'
import { StateLine } from '@/components/signature/state-line'
import { ButtonLink } from '@/components/ui/button-link'

export interface NextStepsProps {
  steps: readonly { key: string; about: string; why: string; action: string; href: Route }[]
}

/** Past this many the list hides what is most urgent. */
const shown = 6

/** What needs this person now, most urgent first, each with the one button that does it. */
export function NextSteps({ steps }: NextStepsProps) {
  if (steps.length === 0) return <p className="mt-3 text-soft">Nothing needs you now.</p>
  const rest = steps.slice(shown)
  return (
    <>
      <Steps steps={steps.slice(0, shown)} />
      {rest.length > 0 && (
        <details className="mt-2">
          <summary className="min-h-control py-1.5 font-bold">and {rest.length} more</summary>
          <Steps steps={rest} />
        </details>
      )}
    </>
  )
}

function Steps({ steps }: NextStepsProps) {
  return (
    <ol className="mt-3 flex flex-col gap-2">
      {steps.map((step, index) => (
        <StateLine
          as="li"
          key={step.key}
          state={index === 0 ? 'act' : 'waiting'}
          title={step.about}
          word={step.why}
          actions={<ButtonLink href={step.href}>{step.action}</ButtonLink>}
        />
      ))}
    </ol>
  )
}
