/**
 * Solves A·x = b for a symmetric positive definite A (row by row, n × n) by Cholesky's factors, for each column of `right`.
 * Null when A is not positive definite: the columns behind it cannot be told apart.
 */
export function solveSymmetric(a: Float64Array, n: number, right: Float64Array[]): Float64Array[] | null {
  const l = new Float64Array(n * n)
  for (let i = 0; i < n; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = a[i * n + j] ?? 0
      for (let k = 0; k < j; k++) sum -= (l[i * n + k] ?? 0) * (l[j * n + k] ?? 0)
      if (i === j) {
        if (!(sum > 0)) return null
        l[i * n + i] = Math.sqrt(sum)
      } else {
        l[i * n + j] = sum / (l[j * n + j] ?? 1)
      }
    }
  }
  return right.map((b) => {
    const x = Float64Array.from(b)
    for (let i = 0; i < n; i++) {
      let sum = x[i] ?? 0
      for (let k = 0; k < i; k++) sum -= (l[i * n + k] ?? 0) * (x[k] ?? 0)
      x[i] = sum / (l[i * n + i] ?? 1)
    }
    for (let i = n - 1; i >= 0; i--) {
      let sum = x[i] ?? 0
      for (let k = i + 1; k < n; k++) sum -= (l[k * n + i] ?? 0) * (x[k] ?? 0)
      x[i] = sum / (l[i * n + i] ?? 1)
    }
    return x
  })
}
