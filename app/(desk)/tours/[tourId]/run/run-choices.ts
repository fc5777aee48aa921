import type { HireChoices } from '@/components/run/hire-form'
import type { ShowChoices } from '@/components/run/show-choices'
import type { Actor } from '@/lib/server/auth/actor'
import { readStageChoices } from '@/lib/server/directory/stages'
import { readSupplierChoices } from '@/lib/server/hires/hires'
import { readPlayerNames } from '@/lib/server/players/players'
import type { Run } from '@/lib/server/tours/read-run'
import { dateWords } from '@/lib/staging/calendar'

/** What the forms of this run choose from. */
export async function runChoices(actor: Actor, run: Run): Promise<{ show: ShowChoices; hire: HireChoices }> {
  const [stages, players, suppliers] = await Promise.all([
    readStageChoices(actor),
    readPlayerNames(actor),
    readSupplierChoices(actor),
  ])
  const shows = run.days.flatMap((day) => day.shows)
  return {
    show: {
      days: run.days.flatMap(({ day }) => (day ? [{ id: day.id, date: day.date }] : [])),
      rigs: run.rigs.map(({ id, name }) => ({ id, name })),
      stages: stages.map(({ id, venueName, stageName, town, zone }) => ({
        id,
        label: [`${venueName}, ${stageName}`, town].filter(Boolean).join(', '),
        zone,
      })),
      players,
      usualPlayerId: shows.at(-1)?.playerId ?? (players.length === 1 ? (players[0]?.id ?? null) : null),
    },
    hire: {
      shows: shows.map(({ id, date, venueName, name }) => ({
        id,
        label: [dateWords(date), venueName, name].filter(Boolean).join(', '),
      })),
      suppliers: suppliers.map(({ id, name, currency }) => ({ id, name, currency })),
    },
  }
}
