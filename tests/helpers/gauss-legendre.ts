/** Points and weights of Gauss–Legendre quadrature on [from, to], exact for polynomials up to degree 2·points − 1 (DLMF 3.5(v)). */
export function gaussLegendre(points: number, from: number, to: number): { at: number; weight: number }[] {
  return Array.from({ length: points }, (_, i) => {
    let x = Math.cos((Math.PI * (i + 0.75)) / (points + 0.5))
    let slope = 1
    for (let step = 0; step < 20; step++) {
      let [lower, here] = [1, x]
      for (let n = 2; n <= points; n++) [lower, here] = [here, ((2 * n - 1) * x * here - (n - 1) * lower) / n]
      slope = (points * (x * here - lower)) / (x * x - 1)
      x -= here / slope
    }
    return { at: from + ((to - from) * (1 + x)) / 2, weight: (to - from) / ((1 - x * x) * slope * slope) }
  })
}
