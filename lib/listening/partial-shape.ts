/** A complex number. */
export type Complex = { re: number; im: number }

/**
 * A voice in a fit: Σ c·e^{s·n}, n in samples, over its terms, times one complex amplitude. `toS` and `toC` are the
 * derivatives of s and c to each free parameter of the model.
 */
export type Term = { s: Complex; c: Complex; toS: Complex[]; toC: Complex[] }

export type ModelKind = 'one' | 'glide' | 'envelope' | 'two'

const zero: Complex = { re: 0, im: 0 }
const one: Complex = { re: 1, im: 0 }

/**
 * The voices of each model, from its free parameters (decay and angle a sample):
 * one [d, w] damped sinusoid; `two` [d1, w1, d2, w2]; `envelope` [d, w, δ] two of one decay at w ± δ/2, for a pair too close to
 * tell their decays apart; `glide` [d, w, γ] one whose pitch falls with its energy, w + 2dγ·e^{−2dn}, the film's
 * stretch going by amplitude squared: phase γ·(1 − e^{−2dn}), so that the voice is
 * e^{iγ}·Σ_m (−iγ)^m/m!·e^{(−(1 + 2m)d + iw)n}, cut off where the terms are below 10⁻⁶.
 * Parameters past the model's own are neighbours, [d, w] of one damped sinusoid each.
 */
export function voicesOf(kind: ModelKind, p: Float64Array): Term[][] {
  return [...ownVoices(kind, p), ...neighbours(kind, p)]
}

function neighbours(kind: ModelKind, p: Float64Array): Term[][] {
  const own = parametersOf[kind]
  return Array.from({ length: (p.length - own) / 2 }, (_, i) => {
    const first = own + 2 * i
    const before = Array.from({ length: first }, () => zero)
    return [simple(p[first] ?? 0, p[first + 1] ?? 0, [...before, decayTo, angleTo])]
  })
}

function ownVoices(kind: ModelKind, p: Float64Array): Term[][] {
  const at = (i: number) => p[i] ?? 0
  switch (kind) {
    case 'one':
      return [[simple(at(0), at(1), [decayTo, angleTo])]]
    case 'two':
      return [
        [simple(at(0), at(1), [decayTo, angleTo, zero, zero])],
        [simple(at(2), at(3), [zero, zero, decayTo, angleTo])],
      ]
    case 'envelope':
      return [
        [simple(at(0), at(1) + at(2) / 2, [decayTo, angleTo, { re: 0, im: 0.5 }])],
        [simple(at(0), at(1) - at(2) / 2, [decayTo, angleTo, { re: 0, im: -0.5 }])],
      ]
    case 'glide':
      return [glide(at(0), at(1), at(2))]
  }
}

export const parametersOf: Record<ModelKind, number> = { one: 2, glide: 3, envelope: 3, two: 4 }

const decayTo: Complex = { re: -1, im: 0 }
const angleTo: Complex = { re: 0, im: 1 }

function simple(d: number, w: number, toS: Complex[]): Term {
  return { s: { re: -d, im: w }, c: one, toS, toC: toS.map(() => zero) }
}

function glide(d: number, w: number, gamma: number): Term[] {
  const terms: Term[] = []
  const turn = { re: Math.cos(gamma), im: Math.sin(gamma) }
  // (−i)^m runs through 1, −i, −1, i.
  const powers: Complex[] = [one, { re: 0, im: -1 }, { re: -1, im: 0 }, { re: 0, im: 1 }]
  let size = 1
  let before = zero
  for (let m = 0; m < 60; m++) {
    const power = powers[m % 4] ?? one
    const c = {
      re: size * (turn.re * power.re - turn.im * power.im),
      im: size * (turn.re * power.im + turn.im * power.re),
    }
    // d/dγ of e^{iγ}(−iγ)^m/m! is i·c_m − i·c_{m−1}.
    const toGamma = { re: -(c.im - before.im), im: c.re - before.re }
    terms.push({
      s: { re: -(1 + 2 * m) * d, im: w },
      c,
      toS: [{ re: -(1 + 2 * m), im: 0 }, angleTo, zero],
      toC: [zero, zero, toGamma],
    })
    before = c
    size *= gamma / (m + 1)
    if (Math.abs(size) < 1e-6) break
  }
  return terms
}
