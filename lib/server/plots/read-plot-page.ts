import { db } from '@/db/client'
import { listChannels } from '@/db/queries/channel'
import { listEntries } from '@/db/queries/kit'
import { findRigHead } from '@/db/queries/revision'
import { listRigs } from '@/db/queries/rig'
import { findTour } from '@/db/queries/tour'
import { AppError } from '@/lib/errors'
import { assertCan, type Actor } from '@/lib/server/auth/actor'
import { noSuchRig, rigPlot } from './read-plot'

/**
 * What the plot and patch pages of a tour show: the chosen rig's plot, channels and kit (the first rig's when none is
 * named), and how this party writes notes and sizes.
 */
export async function readPlotPage(actor: Actor, input: { tourId: string; rigId: string | undefined }) {
  assertCan(actor, 'party:read')
  return db().transaction(
    async (tx) => {
      const tour = await findTour(tx, actor, input.tourId)
      if (!tour) throw new AppError('not-found', 'There is no such tour in this party.')
      const rigs = await listRigs(tx, actor, tour.id)
      const rig = input.rigId === undefined ? rigs[0] : rigs.find(({ id }) => id === input.rigId)
      if (input.rigId !== undefined && !rig) throw noSuchRig()
      const head = rig && (await findRigHead(tx, actor, rig.id))
      if (!rig || !head) return { tour, rig: null }
      const { locale, units, referenceHz } = head.party
      return {
        tour,
        rig: {
          id: rig.id,
          name: rig.name,
          reader: { locale, units, referenceHz },
          plot: await rigPlot(tx, actor, rig.id),
          channels: await listChannels(tx, actor, rig.id),
          entries: await listEntries(tx, actor, { rigId: rig.id, removedToo: true }),
        },
      }
    },
    // Plot, channels and kit must be of one moment.
    { isolationLevel: 'repeatable read', accessMode: 'read only' },
  )
}
