import { db, pool } from '@/db/client'
import { findReadings } from '@/db/queries/bench'
import { dateAfter } from '@/lib/staging/calendar'
import { makeAdvance } from './demo-answers'
import { lastDemoReadingId, makeBench } from './demo-bench'
import { makeGauge } from './demo-gauge'
import { demoToday } from './demo-run'
import { makeSpec } from './demo-spec'
import { demoPartyId, makeTeam } from './demo-team'
import { makeTour } from './demo-tour'

/**
 * Makes the demo party through the same use cases that people use. The same day gives the same rows, and every step can be
 * repeated: a seed that was interrupted goes on where it stopped.
 */
async function main(): Promise<string> {
  if ((await findReadings(db(), { partyId: demoPartyId }, [lastDemoReadingId])).length > 0)
    return 'the demo party Saltmarsh Radio is there already'
  const today = process.env['HOOPWRIGHT_TODAY'] || new Date().toISOString().slice(0, 10)
  const team = await makeTeam()
  await makeTour(team, today)
  await makeGauge(team)
  await makeSpec(team)
  await makeAdvance(team, today)
  await makeBench(team, today, dateAfter(today, -demoToday))
  return 'made the demo party Saltmarsh Radio'
}

main()
  .then((said) => process.stdout.write(`${said}\n`))
  .catch((error: unknown) => {
    process.stderr.write(
      `The demo could not be made: ${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
    )
    process.exitCode = 1
  })
  .finally(() => pool().end())
