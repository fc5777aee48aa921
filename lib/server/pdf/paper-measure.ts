/** Points (1/72 in) of a length in millimetres: exact by definition. */
export function mm(millimetres: number): number {
  return (millimetres * 72) / 25.4
}

/** Sheets in millimetres, upright. */
export const sheetMm = { A4: { width: 210, height: 297 }, Letter: { width: 215.9, height: 279.4 } } as const
export type Sheet = keyof typeof sheetMm

/** Blank edge of every page, and what the running head and foot take of it, millimetres. */
export const marginMm = { side: 12, top: 16, bottom: 13 } as const

/** The room for content on a page, millimetres. */
export function contentMm(sheet: Sheet, orientation: 'portrait' | 'landscape'): { widthMm: number; heightMm: number } {
  const { width, height } = sheetMm[sheet]
  const [across, down] = orientation === 'portrait' ? [width, height] : [height, width]
  return { widthMm: across - 2 * marginMm.side, heightMm: down - marginMm.top - marginMm.bottom }
}
