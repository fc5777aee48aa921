import { spawnSync } from 'node:child_process'
import { cpSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { dirname, join, resolve } from 'node:path'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'

/** Each forbidden import, planted: the rule that must catch it, the file that imports and what it imports. */
const planted: [rule: string, from: string, to: string][] = [
  ['acoustics-is-lowest', 'lib/acoustics/a.ts', 'lib/tuning/target.ts'],
  ['tuning-on-acoustics', 'lib/tuning/b.ts', 'lib/advance/target.ts'],
  ['listening-on-acoustics', 'lib/listening/b.ts', 'lib/tuning/target.ts'],
  ['advance-on-tuning', 'lib/advance/c.ts', 'lib/contracts/target.ts'],
  ['pure-has-no-framework', 'lib/tuning/d.ts', 'node_modules/react/index.js'],
  ['geometry-is-lowest', 'plots/geometry/e.ts', 'plots/model/target.ts'],
  ['model-on-geometry', 'plots/model/f.ts', 'plots/render/target.ts'],
  ['plots-core-is-pure', 'plots/render/g.ts', 'lib/contracts/target.ts'],
  ['contracts-on-pure', 'lib/contracts/h.ts', 'lib/server/target.ts'],
  ['db-on-contracts', 'db/queries/i.ts', 'lib/server/target.ts'],
  ['queries-only-from-server', 'app/j.ts', 'db/queries/target.ts'],
  ['queries-only-from-server', 'components/k.ts', 'db/queries/target.ts'],
  ['server-stays-below', 'lib/server/l.ts', 'components/target.ts'],
  ['client-without-server', 'lib/client/m.ts', 'lib/server/target.ts'],
  ['editor', 'plots/editor/n.ts', 'lib/server/target.ts'],
  ['components', 'components/o.ts', 'lib/server/target.ts'],
  ['ui-knows-no-trade', 'components/ui/p.ts', 'lib/tuning/target.ts'],
  ['app-through-barrel', 'app/q.ts', 'plots/model/target.ts'],
  ['nobody-imports-app', 'components/r.ts', 'app/target.ts'],
  ['tests-stay-outside', 'lib/server/s.ts', 'tests/target.ts'],
]

const root = resolve(import.meta.dirname, '../..')
let folder: string

function write(path: string, text: string): void {
  mkdirSync(dirname(join(folder, path)), { recursive: true })
  writeFileSync(join(folder, path), text)
}

type Report = { summary: { violations: { rule: { name: string }; from: string; to: string }[] } }

function cruise(): Report {
  const run = spawnSync(
    process.execPath,
    [
      join(root, 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs'),
      ...['--config', '.dependency-cruiser.cjs', '--output-type', 'json'],
      ...['app', 'components', 'db', 'lib', 'plots'],
    ],
    { cwd: folder, encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 },
  )
  if (!run.stdout.startsWith('{')) throw new Error(run.stderr)
  return JSON.parse(run.stdout) as Report
}

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'layers-'))
  cpSync(join(root, '.dependency-cruiser.cjs'), join(folder, '.dependency-cruiser.cjs'))
  write('package.json', '{ "name": "planted" }')
  write('tsconfig.json', '{ "compilerOptions": { "module": "esnext", "moduleResolution": "bundler", "paths": { "@/*": ["./*"] } } }')
  write('node_modules/react/package.json', '{ "name": "react", "version": "1.0.0", "main": "index.js" }')
  write('node_modules/react/index.js', 'export const target = 1\n')
  for (const [, , to] of planted) if (!to.startsWith('node_modules')) write(to, 'export type Target = 1\nexport const target = 1\n')
  for (const [, from, to] of planted) {
    // Half a violation is one too: a type alone must be caught.
    write(from, to.startsWith('node_modules') ? `import { target } from 'react'\nexport const x = target\n` : `import type { Target } from '@/${to.replace(/\.ts$/, '')}'\nexport const x: Target = 1\n`)
  }
  write('lib/tuning/round.ts', `import { trip } from './trip'\nexport const round = () => trip\n`)
  write('lib/tuning/trip.ts', `import { round } from './round'\nexport const trip = () => round\n`)
}, 60_000)

afterAll(() => rmSync(folder, { recursive: true, force: true }))

describe('the layer rules catch what they forbid', () => {
  let report: Report
  beforeAll(() => {
    report = cruise()
  }, 60_000)

  test.each(planted)('%s: %s may not import %s', (rule, from, to) => {
    const caught = report.summary.violations.filter((violation) => violation.from === from && violation.to === to)
    expect(caught.map((violation) => violation.rule.name)).toContain(rule)
  })

  test('no-cycles: two files that need each other', () => {
    const cycles = report.summary.violations.filter((violation) => violation.rule.name === 'no-cycles')
    expect(cycles.map((violation) => violation.from)).toContain('lib/tuning/round.ts')
  })
})
