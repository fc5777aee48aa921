import { airDensityKgPerM3, ROOM_TEMPERATURE_C } from './air'
import { airLoadFactor } from './air-load'
import { besselJZero } from './bessel-j'
import { drumModel } from './drum-model'
import type { DrumModel } from './drum-model'
import type { DrumTuning, DrumTuningInput, HeadTuning } from './drum-tuning'
import type { Estimated } from './estimated'
import { figureInput } from './explained-figure'
import type { ExplainedFigure } from './explained-figure'
import { filmArealDensityKgPerM2, filmThicknessM, PET_DENSITY_KG_PER_M3, PET_STRESS_AT_5_PERCENT_PA } from './film'
import { ROD_DIAMETER_M, TORQUE_FACTOR_DRY } from './rod'
import { shellAir } from './shell-air'
import { mostSlackeningNPerM } from './warm-up'

/** From load-in to a full house under light, K (from memory). */
const WARM_UP_K = 10

/** The figures of one head of `drumTuning`, as `explainDrumTuning` gives them. SI units. */
export function explainHeadTuning(input: DrumTuningInput, tuning: DrumTuning, head: HeadTuning): ExplainedFigure[] {
  const film = (head.side === 'batter' ? input.batter : input.resonant) ?? input.batter
  const model = drumModel(input)
  const mass = model.tap.massKgPerM2[head.side === 'batter' ? 0 : 1]
  const thickness = figureInput('h', 'Film thickness, all plies', filmThicknessM(film.plyMils), 'm')
  const coating = figureInput('σc', 'Coating', film.coatingKgPerM2, 'kg/m²')
  const radius = figureInput('a', 'Head radius', input.diameterM / 2, 'm')
  const density = figureInput('σ', 'Mass of the film', filmArealDensityKgPerM2(film), 'kg/m²')
  const moving = figureInput('s', 'Film and the air that moves with it in the tap', mass, 'kg/m²')
  const tension = figureInput('T', 'Film tension', head.tensionNPerM.value, 'N/m')
  const pull = figureInput('F', 'Pull on each rod', head.rodPullN.value, 'N')
  const tap = figureInput('f11', 'Tap beside a lug, other head damped', head.tapHz.value, 'Hz')
  const load = figureInput('β1', 'Air-load factor of the tap, both faces', airLoadFactor(1), '')
  const air = figureInput(
    'ρ',
    'Density of the air',
    airDensityKgPerM3(input.temperatureC ?? ROOM_TEMPERATURE_C),
    'kg/m³',
  )
  const j11 = figureInput('j11', 'First zero of J1', besselJZero(1, 1), '')

  return [
    {
      ...{ id: 'areal-density', ...density, formula: 'σ = ρ(PET)·h + σc', bounds: null, mark: 'published' },
      inputs: [figureInput('ρ(PET)', 'Density of PET film', PET_DENSITY_KG_PER_M3, 'kg/m³'), thickness, coating],
      source: 'Film density: DuPont Teijin Films data sheet H-37232-3.',
    },
    {
      ...{ id: 'tap-density', ...moving, bounds: null, mark: 'derived' },
      ...(tuning.model === 'two-heads'
        ? { formula: 's = σ + β1·ρ·a/2 + μ1', inputs: [density, load, air, radius, shellLoad(input)] }
        : { formula: 's = σ + β1·ρ·a', inputs: [density, load, air, radius] }),
      source:
        'Air load by a one-term Rayleigh quotient, checked against T. D. Rossing, Acoustics of Timpani, 1982; inside, the air of the shell.',
    },
    {
      ...{ id: 'tension', ...tension, bounds: boundsOf(head.tensionNPerM) },
      ...tensionBasis(input, tuning, head, model),
    },
    {
      ...{ id: 'tap', ...tap, formula: 'f11 = (j11/2πa)·√(T/s)', inputs: [j11, radius, tension, moving] },
      ...{ bounds: boundsOf(head.tapHz), mark: tuning.tapRatioMeasured ? 'measured' : 'derived' },
      source: `${tuning.tapRatioMeasured ? 'From the tap ratio measured on this drum' : 'Ideal membrane, Abramowitz & Stegun 9.5'}. Drum off its stand, the other head damped, a fingertip on the centre.`,
    },
    {
      ...{ id: 'rod-pull', ...pull, formula: 'F = 2π·a·T/N', bounds: boundsOf(head.rodPullN), mark: 'derived' },
      inputs: [radius, tension, figureInput('N', 'Lugs', input.lugs, '')],
      source: 'Balance of the edge pull, bearing edge without friction.',
    },
    {
      ...{ id: 'torque', ...figureInput('M', 'Key torque, dry thread', head.torqueNm.value, 'N·m') },
      ...{ formula: 'M = K·d·F', bounds: boundsOf(head.torqueNm), mark: 'published' },
      inputs: [
        figureInput('K', 'Torque factor, dry', TORQUE_FACTOR_DRY, ''),
        figureInput('d', 'Thread diameter, 12-24', ROD_DIAMETER_M, 'm'),
        pull,
      ],
      source: 'Shigley, Mechanical Engineering Design. Scatter ±30 % or more: never even a head by torque alone.',
    },
    {
      ...{ id: 'film-stress', ...figureInput('p', 'Stress in the film', head.filmStressPa.value, 'Pa') },
      ...{ formula: 'p = T/h', bounds: boundsOf(head.filmStressPa), mark: 'derived' },
      inputs: [tension, thickness, figureInput('p5', 'Stress at 5 % strain', PET_STRESS_AT_5_PERCENT_PA, 'Pa')],
      source: 'Stress at 5 % strain: DuPont Teijin Films data sheet H-37232-3.',
    },
    {
      ...{ id: 'warm-up', formula: 'ΔT = 240·(h/254 µm)·(Δt/10 K)', bounds: null, mark: 'from memory' },
      ...figureInput('ΔT', 'Most that warming may take off', mostSlackeningNPerM(film.plyMils, WARM_UP_K), 'N/m'),
      inputs: [thickness, figureInput('Δt', 'Warming of the stage', WARM_UP_K, 'K')],
      source: 'Rim held fast, so an upper bound. Tap again after warm-up, and when a new head has settled.',
    },
    {
      ...{ id: 'range', ...figureInput('y', 'Place in the playable range', head.rangePosition.fraction, '') },
      ...{ formula: 'y = ln(T/Tslack)/ln(Tchoked/Tslack)', bounds: null },
      inputs: [
        tension,
        figureInput('Tslack', 'Slack edge', head.range.slackNPerM, 'N/m'),
        figureInput('Tchoked', 'Choked edge', head.range.chokedNPerM, 'N/m'),
      ],
      ...(film.range
        ? { mark: 'measured', source: 'The range kept for this head. The middle is the safe aim (common practice).' }
        : {
            mark: 'from memory',
            source: 'A default by role: keep your own per head. The middle is the safe aim (common practice).',
          }),
    },
  ]
}

function shellLoad({ diameterM, depthM, temperatureC = ROOM_TEMPERATURE_C }: DrumTuningInput) {
  const { selfKgPerM2 } = shellAir(1, { diameterM, depthM, temperatureC })
  return figureInput('μ1', 'Air of the shell, tap', selfKgPerM2, 'kg/m²')
}

type Basis = Pick<ExplainedFigure, 'formula' | 'inputs' | 'mark' | 'source'>

function tensionBasis(input: DrumTuningInput, tuning: DrumTuning, head: HeadTuning, model: DrumModel): Basis {
  const [batterMass, resonantMass] = model.tap.massKgPerM2
  const note = figureInput('f', 'Note of the drum', tuning.noteHz, 'Hz')
  const radius = figureInput('a', 'Head radius', input.diameterM / 2, 'm')
  const relation = figureInput('c', 'Resonant tap over batter tap', input.relationCents, 'cents')
  if (head.side === 'resonant') {
    return {
      ...{ formula: 'T2 = T1·(s2/s1)·2^(c/600)', mark: 'derived' },
      inputs: [
        figureInput('T1', 'Film tension, batter', tuning.batter.tensionNPerM.value, 'N/m'),
        figureInput('s1', 'Film and air in the tap, batter', batterMass, 'kg/m²'),
        figureInput('s2', 'Film and air in the tap, resonant', resonantMass, 'kg/m²'),
        relation,
      ],
      source: 'The two taps, each with the other head damped, stand as the relation says.',
    }
  }
  if (tuning.tapRatioMeasured) {
    return {
      ...{ formula: 'T = s·(2π·a·r·f/j11)²', mark: 'measured' },
      inputs: [
        figureInput('s', 'Film and air in the tap', batterMass, 'kg/m²'),
        ...[radius, figureInput('r', 'Tap over note, measured', tuning.tapRatio.value, ''), note],
        figureInput('j11', 'First zero of J1', besselJZero(1, 1), ''),
      ],
      source: 'From the tap that the measured ratio asks for.',
    }
  }
  const source = 'Solved to the last digit: the bounds are the model’s, not the arithmetic’s.'
  if (tuning.model === 'two-heads') {
    const formula = 'the T1 that solves the equation of the note, T2 in step'
    return { formula, inputs: [note, relation], mark: 'derived', source }
  }
  return {
    ...{ formula: 'T = σ0·(2π·a·f/j01)²', mark: 'derived', source },
    inputs: [
      figureInput('σ0', 'Film and the air that moves with it in the note', model.note.massKgPerM2[0], 'kg/m²'),
      ...[radius, note, figureInput('j01', 'First zero of J0', besselJZero(0, 1), '')],
    ],
  }
}

function boundsOf({ low, high }: Estimated) {
  return { low, high }
}
