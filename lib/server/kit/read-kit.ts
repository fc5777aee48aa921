import { db } from '@/db/client'
import { listEntries, listKitSources } from '@/db/queries/kit'
import { findRigHead } from '@/db/queries/revision'
import { listRigs } from '@/db/queries/rig'
import { findTour } from '@/db/queries/tour'
import type { Kit } from '@/lib/contracts/kit'
import { AppError } from '@/lib/errors'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { noSuchRig } from '@/lib/server/plots/read-plot'

export async function readKit(actor: Actor, input: { rigId: string; removedToo: boolean }): Promise<Kit> {
  assertCan(actor, 'party:read')
  if (!(await findRigHead(db(), actor, input.rigId))) throw noSuchRig()
  return { rigId: input.rigId, entries: await listEntries(db(), actor, input) }
}

/**
 * What the kit page of a tour shows: the chosen rig's kit (the first when none is named), what it can be
 * copied from, and how this party writes notes and sizes.
 */
export async function readKitPage(actor: Actor, input: { tourId: string; rigId: string | undefined }) {
  assertCan(actor, 'party:read')
  const tour = await findTour(db(), actor, input.tourId)
  if (!tour) throw new AppError('not-found', 'There is no such tour in this party.')
  const rigs = await listRigs(db(), actor, tour.id)
  const rig = input.rigId === undefined ? rigs[0] : rigs.find(({ id }) => id === input.rigId)
  if (input.rigId !== undefined && !rig) throw noSuchRig()
  const head = rig && (await findRigHead(db(), actor, rig.id))
  if (!rig || !head) return { tour, rig: null }
  const { locale, units, referenceHz } = head.party
  return {
    tour,
    rig: {
      id: rig.id,
      name: rig.name,
      reader: { locale, units, referenceHz },
      entries: await listEntries(db(), actor, { rigId: rig.id, removedToo: true }),
      sources: await listKitSources(db(), actor, rig.id),
    },
  }
}
