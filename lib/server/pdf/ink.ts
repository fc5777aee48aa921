import type { Dash, Fill, Weight } from '@/plots/symbols/shape'

/** The paper theme's colours as they are printed; the sheet itself is the paper's own white. */
export const ink = {
  sheet: '#ffffff',
  wash: '#ece6d8',
  ink: '#1b1813',
  soft: '#6b6355',
  line: '#d9d2c2',
  spike: '#ad2f19',
  brass: '#8f5c00',
  reed: '#1d6f5c',
  plum: '#6d3f73',
} as const satisfies Record<Fill, string> & Record<string, string>

/** Stroke widths on paper, millimetres. */
export const strokeMm: Readonly<Record<Weight, number>> = { hair: 0.15, fine: 0.28, bold: 0.5 }

/** Dash patterns on paper, millimetres on and off. */
export const dashMm: Readonly<Record<Dash, readonly number[]>> = { dashed: [1.4, 1], chain: [3, 0.9, 0.6, 0.9] }
