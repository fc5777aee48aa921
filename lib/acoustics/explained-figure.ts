/** How far a figure can be trusted: where it comes from. */
export type FigureMark = 'published' | 'derived' | 'common practice' | 'from memory' | 'measured'

export type FigureInput = { symbol: string; label: string; value: number; unit: string }

/** A figure with its unit, how it was worked out and from what, its bounds where it is an estimate, and where that comes from. SI units. */
export type ExplainedFigure = FigureInput & {
  id: string
  formula: string
  inputs: FigureInput[]
  bounds: { low: number; high: number } | null
  mark: FigureMark
  source: string
}

export function figureInput(symbol: string, label: string, value: number, unit: string): FigureInput {
  return { symbol, label, value, unit }
}
