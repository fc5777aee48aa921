import type { TextRole } from '../symbols/shape'

/** Em heights of the drawing's words, in metres on the stage. */
export type TextSizes = Readonly<Record<TextRole, number>>

const SCREEN_PX: TextSizes = { name: 13, note: 11.5, small: 11.5, channel: 12 }
const PAPER_MM: TextSizes = { name: 2.9, note: 2.5, small: 2.4, channel: 2.6 }

/** Sizes that read on a screen drawn at `pxPerM` pixels a metre. */
export function screenTextSizes(pxPerM: number): TextSizes {
  return scaled(SCREEN_PX, 1 / pxPerM)
}

/** Sizes that read on paper printed at 1:`scale`. */
export function paperTextSizes(scale: number): TextSizes {
  return scaled(PAPER_MM, scale / 1000)
}

function scaled(sizes: TextSizes, by: number): TextSizes {
  return { name: sizes.name * by, note: sizes.note * by, small: sizes.small * by, channel: sizes.channel * by }
}

/** Average advance of a letter in ems, a little over the shipped fonts' so that a label is never wider than planned. */
const ADVANCE_EM: TextSizes = { name: 0.56, note: 0.61, small: 0.56, channel: 0.61 }

/** Planned width of a line of words, metres. */
export function textWidthM(text: string, role: TextRole, sizes: TextSizes): number {
  return [...text].length * ADVANCE_EM[role] * sizes[role]
}
