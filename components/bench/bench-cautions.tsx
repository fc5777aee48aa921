import { planningCaution, tuningCautions } from '@/lib/advance/cautions'

/** What can hurt, beside the figures that are turned to. */
export function BenchCautions() {
  return (
    <section aria-label="Cautions" className="border-l-4 border-brass bg-sheet px-3 py-2 text-[0.9375rem]">
      {tuningCautions.map(({ name, words }) => (
        <p key={name} className="mb-1">
          <strong className="text-brass">{name}.</strong> {words}
        </p>
      ))}
      <p className="text-soft">{planningCaution}</p>
    </section>
  )
}
