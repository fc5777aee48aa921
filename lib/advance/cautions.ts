import { hearingMinutes } from '@/lib/acoustics/hearing'

export interface Caution {
  readonly name: string
  readonly words: string
}

/** The sentence that ends every page with a figure on it. */
export const planningCaution =
  'All figures are estimates for planning. Local codes, the venue’s own limits and licensed or competent people decide.'

/** Cautions for whoever handles a drum's heads and rods. */
export const tuningCautions: readonly Caution[] = [
  {
    name: 'Film and rods',
    words:
      'A head under tension or a rod can let go. Keep faces clear, ease down a head that creaks or goes dead, and replace a bent rod or a dented head.',
  },
  {
    name: 'Hearing',
    words: `Close taps and full strokes are loud. 94 dBA is a day’s dose in ${hearingMinutes(94)} minutes and 100 dBA in ${hearingMinutes(100)} (NIOSH 98-126). Wear ear plugs.`,
  },
]

const lifting: Caution = {
  name: 'Lifting',
  words:
    'Two people over 23 kg, a mechanical aid over 45 kg (common practice). Cases on stairs and ramps: more people, and say who calls.',
}

/** Cautions of a whole pack: for a venue everything, for a supplier what touches delivery. */
export function packCautions(audience: 'venue' | 'supplier'): readonly Caution[] {
  if (audience === 'supplier') return [lifting]
  return [
    ...tuningCautions,
    lifting,
    {
      name: 'Loads',
      words:
        'A castor or a leg loads the floor at one point: compare it with the point load of the stage and the riser, not only with the spread load.',
    },
    {
      name: 'Power',
      words:
        'A competent person ties in. Never defeat the earth. Check volts, hertz and inlets before anything is plugged in.',
    },
  ]
}
