import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { acousticsRows } from './bad-input/acoustics-rows'
import { gaugeRows } from './bad-input/gauge-rows'
import { headRows } from './bad-input/head-rows'
import { kitRows } from './bad-input/kit-rows'
import { listeningRows } from './bad-input/listening-rows'
import { isTyped, notFinite } from './bad-input/refusal-table'

const root = join(import.meta.dirname, '../..')
const rows = [...acousticsRows, ...gaugeRows, ...headRows, ...kitRows, ...listeningRows]

/** Asked from outside their folder, and given nothing that could be a wrong quantity: words, errors, choices by name. */
const TAKE_NO_QUANTITY = new Set([
  ...['AcousticsError', 'GaugeError', 'defaultTensionRange'],
  // Words for figures that are already worked out.
  ...['figureWords', 'hertz', 'kilonewtons', 'readingWords', 'startingWords', 'startingBounds', 'withArticle'],
  ...['intervalReason', 'outWords', 'deviation', 'tapRatioWords', 'tapRatioErrorWords', 'unsureRatioWords'],
  ...['noteRefusalWords', 'tapRefusalWords', 'tapDoubt', 'tapHertz', 'tapHertzError', 'tapNote', 'tapReadingWords'],
  'tapRemarks',
  // Whoever asks has checked the pair of heads; takes what `tapsTogether` checked.
  ...['principalDirections', 'tapsAgree'],
  // The order of a log hangs on ids and numbers that the server keeps, and says nothing of a drum.
  ...['inOrderTaken', 'standingReadings'],
])

/** Functions and classes of the three folders that code elsewhere calls. */
function askedFromOutside(): Set<string> {
  const asked = new Set<string>()
  for (const top of ['app', 'components', 'lib', 'plots', 'db']) {
    for (const file of readdirSync(join(root, top), { recursive: true, encoding: 'utf8' })) {
      if (!/\.tsx?$/.test(file) || /\.test\.tsx?$/.test(file)) continue
      const text = readFileSync(join(root, top, file), 'utf8')
      const imports = /import \{([^}]+)\} from '@\/lib\/(acoustics|tuning|listening)\/([\w-]+)'/g
      for (const [, names = '', folder = '', source = ''] of text.matchAll(imports)) {
        if (join(top, file).startsWith(join('lib', folder) + '/')) continue
        const exported = readFileSync(join(root, 'lib', folder, `${source}.ts`), 'utf8')
        for (const name of names.split(',').map((each) => each.trim())) {
          if (new RegExp(`^export (async )?(function|class) ${name}\\b`, 'm').test(exported)) asked.add(name)
        }
      }
    }
  }
  return asked
}

describe('bad input', () => {
  it('is tried on every function of the ear and the hands that is asked from outside', () => {
    const asked = askedFromOutside()
    expect(asked.size).toBeGreaterThan(50)
    const tried = new Set(rows.map(({ name }) => name))
    expect([...asked].filter((name) => !tried.has(name) && !TAKE_NO_QUANTITY.has(name))).toEqual([])
  })

  it.each(rows)('$name takes the good input, and its answer is all finite numbers', ({ answer }) => {
    expect(notFinite(answer())).toEqual([])
  })

  it.each(rows)('$name refuses every bad one by name, or says that it is not sure', ({ cases }) => {
    expect(cases.length).toBeGreaterThan(0)
    const passed = cases.flatMap(({ label, run, refused }) => {
      try {
        const answer = run()
        return refused(answer) ? [] : [`${label} was answered`]
      } catch (error) {
        return isTyped(error) ? [] : [`${label} threw ${String(error)}`]
      }
    })
    expect(passed).toEqual([])
  })
})
