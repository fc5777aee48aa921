import { areaWords, lengthWords } from '@/plots/symbols/length-words'
import type { Fact } from './pack-document'
import type { PackHireInput, PackShowInput } from './pack-input'
import type { RevisionDocument } from './revision-document'
import { windowWords } from './when-words'

/** What a venue must know of its own stage and of who plays on it. */
export function venueFacts(show: PackShowInput, document: RevisionDocument): Fact[] {
  const { stage, player, slot, sharedKit } = show
  const { units } = document.party
  const power = [
    ...(stage.volts === null ? [] : [`${stage.volts} V`]),
    ...(stage.mainsHz === null ? [] : [`${stage.mainsHz} Hz`]),
    ...(stage.inlets === '' ? [] : [stage.inlets]),
  ]
  return [
    {
      label: 'Stage',
      words: `${stage.name}, ${areaWords(stage.widthM, stage.depthM, units)}, ${stage.heightM > 0 ? `${lengthWords(stage.heightM, units)} high` : 'on the floor'}`,
    },
    ...(stage.access.length > 0 ? [{ label: 'Way in', words: stage.access.join(', ') }] : []),
    {
      label: 'Power',
      words: power.length > 0 ? power.join(', ') : 'not known yet: please tell us volts, hertz and inlets',
    },
    {
      label: 'Player',
      words: [
        player.name,
        `${player.hand}-handed`,
        ...(player.throneHeightM === null ? [] : [`throne at ${lengthWords(player.throneHeightM, units)}`]),
        ...(player.mixes === '' ? [] : [`mixes: ${player.mixes}`]),
      ].join(', '),
    },
    ...(slot
      ? [
          {
            label: 'Slot',
            words: [
              `changeover ${slot.changeoverMin} min`,
              `line check ${slot.lineCheckMin} min`,
              ...(slot.riserParking === '' ? [] : [`riser parks: ${slot.riserParking}`]),
            ].join(', '),
          },
        ]
      : []),
    ...(sharedKit
      ? [
          {
            label: 'Shared kit',
            words: [
              `of ${sharedKit.owner}`,
              sharedKit.mayRetune ? 'may be retuned' : 'must not be retuned',
              ...(sharedKit.maySwap === '' ? [] : [`may be swapped: ${sharedKit.maySwap}`]),
            ].join(', '),
          },
        ]
      : []),
    ...(show.supplierNames.length > 0
      ? [{ label: 'Rented kit comes from', words: show.supplierNames.join(', ') }]
      : []),
  ]
}

/** When and how a hire comes and goes. */
export function hireFacts(hire: PackHireInput): Fact[] {
  const window = (date: string | null, from: string | null, until: string | null) =>
    date ? windowWords(date, from, until, hire.zone) : 'date not set yet'
  return [
    { label: 'Delivery', words: window(hire.deliveryDate, hire.deliveryFrom, hire.deliveryUntil) },
    { label: 'Collection', words: window(hire.collectionDate, hire.collectionFrom, hire.collectionUntil) },
    ...(hire.receiver === '' ? [] : [{ label: 'Received by', words: hire.receiver }]),
    ...(hire.conditionOnReturn === '' ? [] : [{ label: 'Condition on return', words: hire.conditionOnReturn }]),
    ...(hire.poNumber === '' ? [] : [{ label: 'PO number', words: hire.poNumber }]),
  ]
}
