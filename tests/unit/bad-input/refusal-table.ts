import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { GaugeError } from '@/lib/tuning/gauge-error'

/** One function with an input that it takes, and inputs that it must not. */
export type Row = {
  name: string
  /** The answer to the good input. */
  answer: () => unknown
  cases: readonly BadCase[]
}

export type BadCase = { label: string; run: () => unknown; refused: (answer: unknown) => boolean }

/** A place in the input by its keys, and what must not stand there. */
export type Bad = readonly [place: string, ...values: readonly unknown[]]

/**
 * A row whose every number is tried as not a number and as either infinity, besides what `bad` names place by place.
 * @param refused for functions that answer with an honest refusal where others throw
 */
export function row<Input>(
  name: string,
  call: (input: Input) => unknown,
  good: Input,
  bad: readonly Bad[] = [],
  refused: (answer: unknown) => boolean = () => false,
): Row {
  const everywhere = numbersOf(good).map((place): Bad => [place, Number.NaN, Infinity, -Infinity])
  const cases = [...everywhere, ...bad].flatMap(([place, ...values]) =>
    values.map((value) => ({
      label: `${place} = ${Array.isArray(value) ? JSON.stringify(value) : String(value)}`,
      run: () => call(withAt(good, place.split('.'), value) as Input),
      refused,
    })),
  )
  return { name, answer: () => call(good), cases }
}

/** A refusal that a caller can tell from a fault of the program: it names what was refused. */
export function isTyped(error: unknown): boolean {
  if (error instanceof AcousticsError || error instanceof GaugeError) return error.field !== ''
  return error instanceof RangeError && /^\w+(\.\w+)? is .+: (allowed|at least|a whole number)/.test(error.message)
}

/** Places of all numbers in an input. Arrays of samples are not walked through. */
function numbersOf(value: unknown, place: readonly string[] = []): string[] {
  if (typeof value === 'number') return [place.join('.')]
  return isTree(value) ? Object.entries(value).flatMap(([key, inner]) => numbersOf(inner, [...place, key])) : []
}

/** Every number of an answer that is none, or is infinite, by its place. */
export function notFinite(answer: unknown, place = 'answer'): string[] {
  if (typeof answer === 'number') return Number.isFinite(answer) ? [] : [`${place} = ${answer}`]
  return isTree(answer) ? Object.entries(answer).flatMap(([key, inner]) => notFinite(inner, `${place}.${key}`)) : []
}

function isTree(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !ArrayBuffer.isView(value)
}

function withAt(value: unknown, [key, ...rest]: readonly string[], put: unknown): unknown {
  if (key === undefined) return put
  if (!isTree(value)) throw new Error(`the good input has no place ${key}`)
  if (Array.isArray(value))
    return value.map((inner: unknown, i) => (String(i) === key ? withAt(inner, rest, put) : inner))
  return { ...value, [key]: withAt(value[key], rest, put) }
}
