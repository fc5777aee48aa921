import { StateLine } from '@/components/signature/state-line'

/** Four answers as they come back from a supplier. */
export function ExampleAnswers() {
  return (
    <ul className="space-y-2">
      <StateLine as="li" state="settled" title="Rack tom, 12 in across, 8 deep, 6 lugs" word="as asked" />
      <StateLine as="li" state="waiting" title="Floor tom, 16 in across, 14 deep" word="instead: 16 across, 16 deep" />
      <StateLine as="li" state="waiting" title="Boom stands, 8" word="6 as asked, 2 not yet, by Monday" />
      <StateLine as="li" state="act" title="Hi-hat stand, two leg" word="can’t" />
    </ul>
  )
}
