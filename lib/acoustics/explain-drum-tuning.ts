import { airDensityKgPerM3, ROOM_TEMPERATURE_C } from './air'
import { airLoadFactor } from './air-load'
import { besselJZero } from './bessel-j'
import { AIR_STIFFNESS_PA } from './coupled-heads'
import { drumTuning } from './drum-tuning'
import type { DrumTuning, DrumTuningInput } from './drum-tuning'
import { explainHeadTuning } from './explain-head-tuning'
import { figureInput } from './explained-figure'
import type { ExplainedFigure } from './explained-figure'
import { openAirDensityKgPerM2 } from './open-air-head'
import { shellAir } from './shell-air'
import { uniformOverlap } from './shell-overlap'
import type { HeadSide } from './tension-range'
import { loadedPair } from './two-head-drum'

export type DrumExplanation = {
  /** Of the drum as a whole, in the order in which they follow from one another. */
  drum: ExplainedFigure[]
  heads: { side: HeadSide; figures: ExplainedFigure[] }[]
}

/**
 * The figures of `drumTuning` with formula, inputs, bounds, mark and source each: what a "why these numbers" view shows. SI units.
 * @throws AcousticsError as `drumTuning`
 */
export function explainDrumTuning(input: DrumTuningInput): DrumExplanation {
  const tuning = drumTuning(input)
  const heads = [tuning.batter, ...(tuning.resonant ? [tuning.resonant] : [])]
  return {
    drum: [airFigure(input), ...(tuning.model === 'two-heads' ? twoHeads(input, tuning) : oneHead(input, tuning))],
    heads: heads.map((head) => ({ side: head.side, figures: explainHeadTuning(input, tuning, head) })),
  }
}

function airFigure({ temperatureC = ROOM_TEMPERATURE_C }: DrumTuningInput): ExplainedFigure {
  return {
    ...{ id: 'air-density', ...figureInput('ρ', 'Density of the air', airDensityKgPerM3(temperatureC), 'kg/m³') },
    ...{
      formula: 'ρ = 1.2041·293.15/(273.15 + t)',
      inputs: [figureInput('t', 'Stage temperature', temperatureC, '°C')],
    },
    ...{ bounds: null, mark: 'published', source: 'Dry air at 20 °C and 101 325 Pa; ideal gas law.' },
  }
}

function twoHeads(input: DrumTuningInput, tuning: DrumTuning): ExplainedFigure[] {
  const { diameterM, depthM, temperatureC = ROOM_TEMPERATURE_C } = input
  const shell = { diameterM, depthM, temperatureC }
  const [noteAir, tapAir] = [shellAir(0, shell), shellAir(1, shell)]
  const pair = loadedPair(0, { ...input, resonant: input.resonant ?? input.batter })
  const air = figureInput('ρ', 'Density of the air', airDensityKgPerM3(temperatureC), 'kg/m³')
  const size = [
    figureInput('a', 'Head radius', diameterM / 2, 'm'),
    figureInput('L', 'Depth of the shell', depthM, 'm'),
  ]
  const plug = figureInput('w0', 'Share of the note that moves the air as a plug', uniformOverlap(), '')
  const cross = figureInput('χ', 'Air handed from head to head, note', noteAir.crossKgPerM2, 'kg/m²')
  const tapCross = figureInput('χ1', 'Air handed from head to head, tap', tapAir.crossKgPerM2, 'kg/m²')
  const { batter, resonant, upperPartnerHz, sustain, falseWarbleHz } = tuning
  const equation = [
    figureInput('γP0', 'Stiffness of the air', AIR_STIFFNESS_PA, 'Pa'),
    ...size,
    figureInput('T1', 'Film tension, batter', batter.tensionNPerM.value, 'N/m'),
    figureInput('T2', 'Film tension, resonant', resonant?.tensionNPerM.value ?? 0, 'N/m'),
    figureInput('s1', 'Film and air, batter', pair.massKgPerM2[0], 'kg/m²'),
    figureInput('s2', 'Film and air, resonant', pair.massKgPerM2[1], 'kg/m²'),
    cross,
  ]
  const cylinder =
    'Incompressible air in a rigid cylinder, the head’s shape laid out in the cylinder’s own modes (DLMF 10.22). The wall and vents are left out.'
  return [
    {
      ...{ id: 'shell-air', ...figureInput('μ', 'Air of the shell on each head, note', noteAir.selfKgPerM2, 'kg/m²') },
      ...{ formula: 'μ = ρ·a·(w0·L/3a + Σ wn·coth(kn·L/a)/kn)', inputs: [air, ...size, plug] },
      ...{ bounds: null, mark: 'derived', source: cylinder },
    },
    {
      ...{ id: 'shell-cross', ...cross, formula: 'χ = ρ·a·(w0·L/6a − Σ wn/(kn·sinh(kn·L/a)))' },
      ...{ inputs: [air, ...size, plug], bounds: null, mark: 'derived', source: cylinder },
    },
    {
      ...{ id: 'tap-air', ...figureInput('μ1', 'Air of the shell on each head, tap', tapAir.selfKgPerM2, 'kg/m²') },
      ...{ formula: 'μ1 = ρ·a·Σ wn·coth(kn·L/a)/kn', inputs: [air, ...size], bounds: null, mark: 'derived' },
      source: cylinder,
    },
    {
      ...{ id: 'note', ...figureInput('f', 'Note of the drum', tuning.noteHz, 'Hz') },
      ...{ formula: '1 + (γP0·a²/L)·Σ g²·J2(x)/(x²·J0(x)) = 0, x = 2π·f·a·√λ', inputs: equation, bounds: null },
      ...noteSource(tuning),
    },
    ...(upperPartnerHz
      ? [
          {
            ...{
              id: 'upper-partner',
              ...figureInput('f′', 'Upper partner, heads against each other', upperPartnerHz.value, 'Hz'),
            },
            ...{ formula: 'the next root of the same equation', inputs: equation, bounds: boundsOf(upperPartnerHz) },
            ...{ mark: 'derived' as const, source: 'Adiabatic air at sea level in a rigid shell.' },
          },
        ]
      : []),
    ratioFigure(tuning),
    ...(sustain === null
      ? []
      : [
          {
            ...{ id: 'sustain', ...figureInput('S', 'Sustain share', sustain, '') },
            ...{ formula: 'S = 1 − |q1 − q2|/(|q1| + |q2|)', inputs: equation, bounds: null, mark: 'derived' as const },
            source:
              'q: air each head pushes along the axis in the note. 1 when the heads are matched: one gives what the other takes, little sounds away and the note lasts. It falls as they part. A share, not seconds.',
          },
        ]),
    ...(falseWarbleHz === null
      ? []
      : [
          {
            ...{
              id: 'false-warble',
              ...figureInput('Δf', 'False warble while the other head rings', falseWarbleHz, 'Hz'),
            },
            ...{ formula: 'Δf = f+ − f−, k²·T = ω²·M, k = j11/a', bounds: null, mark: 'derived' as const },
            inputs: [...size, figureInput('μ1', 'Air of the shell, tap', tapAir.selfKgPerM2, 'kg/m²'), tapCross],
            source:
              'The air couples the heads, so even heads seem to warble. Damp the other head while you tap and it is gone.',
          },
        ]),
  ]
}

function noteSource({ tapRatioMeasured }: DrumTuning): Pick<ExplainedFigure, 'mark' | 'source'> {
  if (tapRatioMeasured) {
    return {
      mark: 'measured',
      source: 'The note wanted. Its place under the tap was measured on this drum; the equation is not used.',
    }
  }
  return {
    mark: 'derived',
    source:
      'Two films on one shell and the air between, λ and g from tensions and masses; checked against an independent Galerkin solution. Without air masses it is the exact equation.',
  }
}

function oneHead(input: DrumTuningInput, tuning: DrumTuning): ExplainedFigure[] {
  const density = openAirDensityKgPerM2(0, { ...input.batter, ...input })
  return [
    {
      ...{ id: 'note', ...figureInput('f01', 'Note of the drum', tuning.noteHz, 'Hz'), bounds: null },
      formula: 'f01 = (j01/2πa)·√(T/σ0), σ0 = σ + β0·ρ·a',
      inputs: [
        figureInput('j01', 'First zero of J0', besselJZero(0, 1), ''),
        figureInput('a', 'Head radius', input.diameterM / 2, 'm'),
        figureInput('T', 'Film tension, batter', tuning.batter.tensionNPerM.value, 'N/m'),
        figureInput('β0', 'Air-load factor of the note, both faces', airLoadFactor(0), ''),
        figureInput('σ0', 'Film and the air that moves with it', density, 'kg/m²'),
      ],
      ...{ mark: tuning.tapRatioMeasured ? 'measured' : 'derived' },
      source:
        'With a port or without a resonant head the shell is no closed cavity: the batter is taken as a head in the open air (Abramowitz & Stegun 9.5; T. D. Rossing, Acoustics of Timpani, 1982), with wider bounds. A measured tap ratio is worth much more here.',
    },
    ratioFigure(tuning),
  ]
}

function ratioFigure({ tapRatio, tapRatioMeasured, batter, noteHz }: DrumTuning): ExplainedFigure {
  const inputs = [
    figureInput('f11', 'Tap beside a lug, batter', batter.tapHz.value, 'Hz'),
    figureInput('f', 'Note of the drum', noteHz, 'Hz'),
  ]
  return {
    ...{ id: 'tap-ratio', ...figureInput('r', 'Tap over note', tapRatio.value, ''), formula: 'r = f11/f', inputs },
    bounds: boundsOf(tapRatio),
    ...(tapRatioMeasured
      ? { mark: 'measured', source: 'Measured on this drum: it replaces the model.' }
      : {
          mark: 'derived',
          source:
            'Without air it would be 1.593. Air weighs more on the note than on the tap, so on a real drum it lies near 1.7 to 1.8. Measure it once and keep it: it then replaces the model.',
        }),
  }
}

function boundsOf({ low, high }: { low: number; high: number }) {
  return { low, high }
}
