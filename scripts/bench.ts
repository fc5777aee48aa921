import { mkdirSync, readdirSync, writeFileSync } from 'node:fs'
import { fileURLToPath, pathToFileURL } from 'node:url'
import type { Bench, BenchRow } from '@/tests/bench/bench-row'

/**
 * `npm run bench` runs every benchmark of tests/bench, `npm run bench -- NAME …` those named. Each prints a table and
 * writes tests/bench/results/NAME.json.
 */
const folder = fileURLToPath(new URL('../tests/bench/', import.meta.url))
const ending = '.bench.ts'
const there = readdirSync(folder)
  .filter((file) => file.endsWith(ending))
  .map((file) => file.slice(0, -ending.length))
  .sort()
const asked = process.argv.slice(2)
const unknown = asked.filter((name) => !there.includes(name))
if (unknown.length > 0) {
  console.error(`No benchmark is called ${unknown.join(', ')}. There are: ${there.join(', ')}.`)
  process.exit(1)
}

mkdirSync(`${folder}results`, { recursive: true })
for (const name of asked.length === 0 ? there : asked) {
  console.log(`\n${name}`)
  const bench = (await import(pathToFileURL(`${folder}${name}${ending}`).href)) as { rows: Bench }
  const rows = await bench.rows((line) => console.log(`  … ${line}`))
  writeFileSync(`${folder}results/${name}.json`, `${JSON.stringify({ name, rows }, null, 2)}\n`)
  print(rows)
}

function print(rows: readonly BenchRow[]): void {
  const lines = rows.map((row) => [
    row.case,
    row.metric,
    `${short(row.value)} ${row.unit}`.trim(),
    row.baseline === null ? '' : `${row.baseline} ${short(row.baselineValue)}`,
    row.ratio === null ? '' : `×${short(row.ratio)}`,
    row.goal === null ? '' : `${(row.ratio ?? row.value) <= row.goal ? 'within' : 'OVER'} ${short(row.goal)}`,
  ])
  const widths = lines.reduce<number[]>((most, line) => line.map((cell, i) => Math.max(most[i] ?? 0, cell.length)), [])
  for (const line of lines) console.log(`  ${line.map((cell, i) => cell.padEnd(widths[i] ?? 0)).join('  ')}`.trimEnd())
}

function short(value: number | null): string {
  if (value === null) return ''
  const size = Math.abs(value)
  return size === 0 || (size >= 0.01 && size < 1e5) ? String(Number(value.toPrecision(4))) : value.toExponential(2)
}
