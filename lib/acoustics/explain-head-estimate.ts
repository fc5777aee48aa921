import { airDensityKgPerM3, ROOM_TEMPERATURE_C } from './air'
import { airLoadFactor } from './air-load'
import { besselJZero } from './bessel-j'
import { filmArealDensityKgPerM2, filmThicknessM, PET_DENSITY_KG_PER_M3, PET_STRESS_AT_5_PERCENT_PA } from './film'
import { headEstimate } from './head-estimate'
import type { HeadEstimateInput } from './head-estimate'
import { openAirDensityKgPerM2 } from './open-air-head'
import { ROD_DIAMETER_M, TORQUE_FACTOR_DRY } from './rod'

/** How far a figure can be trusted: where it comes from. */
export type FigureMark = 'published' | 'derived' | 'common practice' | 'from memory' | 'measured'

export type FigureInput = { symbol: string; label: string; value: number; unit: string }

export type ExplainedFigure = FigureInput & {
  id:
    | 'areal-density'
    | 'air-density'
    | 'moving-density'
    | 'tension'
    | 'tap'
    | 'rod-pull'
    | 'torque'
    | 'film-stress'
    | 'range'
  formula: string
  inputs: FigureInput[]
  mark: FigureMark
  source: string
}

/**
 * The figures of `headEstimate` in the order in which they follow from one another, each with its value, unit, formula,
 * the inputs it was worked out from, and its source: what a "why these numbers" view shows. SI units throughout.
 * @throws AcousticsError as `headEstimate`
 */
export function explainHeadEstimate(input: HeadEstimateInput): ExplainedFigure[] {
  const estimate = headEstimate(input)
  const temperatureC = input.temperatureC ?? ROOM_TEMPERATURE_C

  const thickness = figure('h', 'Film thickness, all plies', filmThicknessM(input.plyMils), 'm')
  const coating = figure('σc', 'Coating', input.coatingKgPerM2, 'kg/m²')
  const radius = figure('a', 'Head radius', input.diameterM / 2, 'm')
  const note = figure('f01', 'Note wanted', estimate.noteHz, 'Hz')
  const lugs = figure('N', 'Lugs', input.lugs, '')
  const density = figure('σ', 'Mass of the film', filmArealDensityKgPerM2(input), 'kg/m²')
  const air = figure('ρ', 'Density of the air', airDensityKgPerM3(temperatureC), 'kg/m³')
  const load = figure('β0', 'Air-load factor of the note, both faces', airLoadFactor(0), '')
  const tapLoad = figure('β1', 'Air-load factor of the tap, both faces', airLoadFactor(1), '')
  const moving = figure('σ0', 'Film and the air that moves with it', openAirDensityKgPerM2(0, input), 'kg/m²')
  const tension = figure('T', 'Film tension', estimate.tensionNPerM, 'N/m')
  const pull = figure('F', 'Pull on each rod', estimate.rodPullN, 'N')

  return [
    {
      ...{ id: 'areal-density', ...density, formula: 'σ = ρ(PET)·h + σc', mark: 'published' },
      inputs: [figure('ρ(PET)', 'Density of PET film', PET_DENSITY_KG_PER_M3, 'kg/m³'), thickness, coating],
      source: 'Film density: DuPont Teijin Films data sheet H-37232-3.',
    },
    {
      ...{ id: 'air-density', ...air, formula: 'ρ = 1.2041·293.15/(273.15 + t)', mark: 'published' },
      inputs: [figure('t', 'Stage temperature', temperatureC, '°C')],
      source: 'Dry air at 20 °C and 101 325 Pa; ideal gas law.',
    },
    {
      ...{ id: 'moving-density', ...moving, formula: 'σ0 = σ + β0·ρ·a', mark: 'derived' },
      inputs: [density, load, air, radius],
      source:
        'Open air on both faces, one-term Rayleigh quotient; checked against T. D. Rossing, Acoustics of Timpani, 1982.',
    },
    {
      ...{ id: 'tension', ...tension, formula: 'T = σ0·(2π·a·f01/j01)²', mark: 'derived' },
      inputs: [moving, radius, note, figure('j01', 'First zero of J0', besselJZero(0, 1), '')],
      source: 'Ideal membrane, Abramowitz & Stegun 9.5, DLMF 10.21. The shell and the other head are left out.',
    },
    tapFigure(input, estimate.tapHz, estimate.tapRatio, [note, density, load, tapLoad, air, radius]),
    {
      ...{ id: 'rod-pull', ...pull, formula: 'F = 2π·a·T/N', mark: 'derived' },
      inputs: [radius, tension, lugs],
      source: 'Balance of the edge pull, bearing edge without friction.',
    },
    {
      ...{ id: 'torque', ...figure('M', 'Key torque, dry thread', estimate.torqueNm.nominalNm, 'N·m') },
      ...{ formula: 'M = K·d·F', mark: 'published' },
      inputs: [
        figure('K', 'Torque factor, dry', TORQUE_FACTOR_DRY, ''),
        figure('d', 'Thread diameter, 12-24', ROD_DIAMETER_M, 'm'),
        pull,
      ],
      source: 'Shigley, Mechanical Engineering Design. Scatter ±30 % or more: never even a head by torque alone.',
    },
    {
      ...{ id: 'film-stress', ...figure('s', 'Stress in the film', estimate.filmStressPa, 'Pa') },
      ...{ formula: 's = T/h', mark: 'derived' },
      inputs: [tension, thickness, figure('s5', 'Stress at 5 % strain', PET_STRESS_AT_5_PERCENT_PA, 'Pa')],
      source: 'Stress at 5 % strain: DuPont Teijin Films data sheet H-37232-3.',
    },
    {
      ...{ id: 'range', ...figure('x', 'Place in the playable range', estimate.rangePosition.fraction, '') },
      ...{ formula: 'x = ln(T/Tslack)/ln(Tchoked/Tslack)', mark: 'from memory' },
      inputs: [
        tension,
        figure('Tslack', 'Slack edge', estimate.range.slackNPerM, 'N/m'),
        figure('Tchoked', 'Choked edge', estimate.range.chokedNPerM, 'N/m'),
      ],
      source:
        'The edges are a default by role, or the range kept for this head. The middle is the safe aim (common practice).',
    },
  ]
}

function tapFigure(input: HeadEstimateInput, tapHz: number, tapRatio: number, inputs: FigureInput[]): ExplainedFigure {
  const tap = figure('f11', 'Tap beside a lug', tapHz, 'Hz')
  if (input.measuredTapRatio !== undefined) {
    return {
      ...{ id: 'tap', ...tap, formula: 'f11 = r·f01', mark: 'measured' },
      inputs: [figure('f01', 'Note wanted', input.noteHz, 'Hz'), figure('r', 'Tap over note, measured', tapRatio, '')],
      source: 'Measured on this drum.',
    }
  }
  return {
    ...{ id: 'tap', ...tap, formula: 'f11 = f01·(j11/j01)·√((σ + β0·ρ·a)/(σ + β1·ρ·a))', mark: 'derived' },
    inputs: [
      ...inputs,
      figure('j11', 'First zero of J1', besselJZero(1, 1), ''),
      figure('j01', 'First zero of J0', besselJZero(0, 1), ''),
    ],
    source:
      'Air loads the note more than the tap, so the ratio is above the ideal 1.593. Open air; on a shell the tap lies lower. A measured ratio replaces this.',
  }
}

function figure(symbol: string, label: string, value: number, unit: string): FigureInput {
  return { symbol, label, value, unit }
}
