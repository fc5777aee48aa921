/** Lower Cholesky factor of a symmetric positive definite matrix. @throws RangeError when it is not */
function cholesky(matrix: readonly (readonly number[])[]): number[][] {
  const factor: number[][] = []
  matrix.forEach((row, i) => {
    const made: number[] = []
    factor.push(made)
    for (let j = 0; j <= i; j++) {
      const other = factor[j] ?? []
      let rest = row[j] ?? Number.NaN
      for (let k = 0; k < j; k++) rest -= (made[k] ?? 0) * (other[k] ?? 0)
      if (i === j && !(rest > 0)) throw new RangeError('The matrix is not positive definite.')
      made.push(i === j ? Math.sqrt(rest) : rest / (other[j] ?? Number.NaN))
    }
  })
  return factor
}

function forward(factor: readonly (readonly number[])[], right: readonly number[]): number[] {
  const answer: number[] = []
  factor.forEach((row, i) => {
    let rest = right[i] ?? 0
    for (let k = 0; k < i; k++) rest -= (row[k] ?? 0) * (answer[k] ?? 0)
    answer.push(rest / (row[i] ?? Number.NaN))
  })
  return answer
}

function backward(factor: readonly (readonly number[])[], right: readonly number[]): number[] {
  const answer = [...right]
  for (let i = factor.length - 1; i >= 0; i--) {
    let rest = right[i] ?? 0
    for (let k = i + 1; k < factor.length; k++) rest -= (factor[k]?.[i] ?? 0) * (answer[k] ?? 0)
    answer[i] = rest / (factor[i]?.[i] ?? Number.NaN)
  }
  return answer
}

/** x of matrix·x = right, the matrix symmetric and positive definite. @throws RangeError when it is not */
export function solveSymmetric(matrix: readonly (readonly number[])[], right: readonly number[]): number[] {
  const factor = cholesky(matrix)
  return backward(factor, forward(factor, right))
}

/** Eigenvalues λ of stiffness·x = λ·mass·x, rising; both symmetric, mass positive definite. By Cholesky and Jacobi rotations. */
export function generalisedEigenvalues(
  stiffness: readonly (readonly number[])[],
  mass: readonly (readonly number[])[],
): number[] {
  const factor = cholesky(mass)
  const half = stiffness.map((row) => forward(factor, row))
  const columns = half.map((_, j) => half.map((row) => row[j] ?? 0))
  const a = columns.map((column) => forward(factor, column))
  const at = (i: number, j: number) => a[i]?.[j] ?? 0
  const set = (i: number, j: number, value: number) => {
    const row = a[i]
    if (row) row[j] = value
  }
  for (let sweep = 0; sweep < 60; sweep++) {
    let off = 0
    for (let p = 0; p < a.length; p++) {
      for (let q = p + 1; q < a.length; q++) {
        const [pp, qq, pq] = [at(p, p), at(q, q), at(p, q)]
        off = Math.max(off, Math.abs(pq) / Math.sqrt(Math.abs(pp * qq)))
        if (pq === 0) continue
        const angle = Math.atan2(2 * pq, qq - pp) / 2
        const [c, s] = [Math.cos(angle), Math.sin(angle)]
        for (let i = 0; i < a.length; i++) {
          const [ip, iq] = [at(i, p), at(i, q)]
          set(i, p, c * ip - s * iq)
          set(i, q, s * ip + c * iq)
        }
        for (let i = 0; i < a.length; i++) {
          const [pi, qi] = [at(p, i), at(q, i)]
          set(p, i, c * pi - s * qi)
          set(q, i, s * pi + c * qi)
        }
      }
    }
    if (off < 1e-14) break
  }
  return a.map((_, i) => at(i, i)).sort((x, y) => x - y)
}
