import type { Db, Scope } from '@/db/client'
import { listCommandsAfter, newestSnapshot } from '@/db/queries/plot'
import type { PlotCommand } from '@/plots/model/command'
import { emptyDocument } from '@/plots/model/document'
import { foldCommands, SNAPSHOT_EVERY, type PlotSnapshot } from '@/plots/model/fold'
import { readDocument } from '@/plots/model/read-document'

/** The document of a plot, folded from its newest snapshot. */
export async function loadPlot(db: Db, scope: Scope, plotId: string): Promise<PlotSnapshot> {
  const snapshot = await newestSnapshot(db, scope, plotId)
  let folded: PlotSnapshot = snapshot
    ? { sequence: snapshot.sequence, document: readDocument(snapshot.document) }
    : { sequence: 0, document: emptyDocument }
  for (;;) {
    const rows = await listCommandsAfter(db, scope, { plotId, after: folded.sequence, limit: SNAPSHOT_EVERY })
    // Commands were checked by the model before they were kept; jsonb has no type of its own.
    folded = foldCommands(
      folded,
      rows.map(({ sequence, command }) => ({ sequence, command: command as PlotCommand })),
    )
    if (rows.length < SNAPSHOT_EVERY) return folded
  }
}
