/** Scales a plot is printed at, largest drawing first: 1:50 and 1:100 metric, 1/4 in and 1/8 in to the foot. */
export const PAPER_SCALES = { metric: [50, 100], imperial: [48, 96] } as const

/** Scales of the kit inset, largest drawing first. */
export const INSET_SCALES = [10, 20] as const

/** Millimetres on paper of a length in metres at scale 1:`scale`. Throws RangeError unless the scale is positive. */
export function paperMm(lengthM: number, scale: number): number {
  if (!(scale > 0)) throw new RangeError('A scale must be greater than nought')
  return (lengthM * 1000) / scale
}

/** The first of `scales` (given largest drawing first) at which an area fits a box of paper, or null when none does. */
export function largestScaleThatFits(
  area: { readonly widthM: number; readonly depthM: number },
  box: { readonly widthMm: number; readonly heightMm: number },
  scales: readonly number[],
): number | null {
  // A hundredth of a millimetre: below any printer, above floating-point noise at an exact fit.
  const slackMm = 0.01
  return (
    scales.find(
      (scale) =>
        paperMm(area.widthM, scale) <= box.widthMm + slackMm && paperMm(area.depthM, scale) <= box.heightMm + slackMm,
    ) ?? null
  )
}
