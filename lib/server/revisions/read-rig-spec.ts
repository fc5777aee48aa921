import type { Db, Scope } from '@/db/client'
import { listChannels } from '@/db/queries/channel'
import { findRigPlot } from '@/db/queries/plot'
import { findRigHead, listSpecEntries } from '@/db/queries/revision'
import type { FrozenEntry } from '@/lib/advance/frozen-kit'
import type { RigSpec } from '@/lib/advance/revision-document'
import { loadToursGauge } from '@/lib/server/gauges/read-gauges'
import { loadPlot } from '@/lib/server/plots/load-plot'
import { emptyDocument } from '@/plots/model/document'

/** A rig as it is at this moment: what a revision of it would freeze. Undefined when it is not the party's. */
export async function readRigSpec(db: Db, scope: Scope, rigId: string): Promise<RigSpec | undefined> {
  const head = await findRigHead(db, scope, rigId)
  if (!head) return undefined
  const entries = await listSpecEntries(db, scope, rigId)
  const channels = await listChannels(db, scope, rigId)
  const plot = await findRigPlot(db, scope, rigId)
  const gauge = await loadToursGauge(db, scope)
  const { sequence, document } = plot ? await loadPlot(db, scope, plot.id) : { sequence: 0, document: emptyDocument }
  return {
    ...head,
    // The contract checked each spec against its kind on the way in; the two columns lose that tie.
    kit: entries as FrozenEntry[],
    plot: { sequence, document },
    channels: channels.map(({ id, number, name, pieceId, output, stand, phantom }) => ({
      ...{ id, number, name, pieceId, output, stand, phantom },
    })),
    gauge,
  }
}
