import { db } from '@/db/client'
import type { Db, Scope } from '@/db/client'
import { findRigPlot, listCommandsAfter, rigExists } from '@/db/queries/plot'
import { MISSED_LIMIT } from '@/lib/contracts/plot'
import type { MissedCommands, PlotAnswer } from '@/lib/contracts/plot'
import { AppError } from '@/lib/errors'
import { assertCan, type Actor } from '@/lib/server/auth/actor'
import type { PlotCommand } from '@/plots/model/command'
import { emptyDocument } from '@/plots/model/document'
import { loadPlot } from './load-plot'

export function noSuchRig(): AppError {
  return new AppError('not-found', 'There is no such rig in this party.')
}

/** The rig's plot as it now is: for the editor, and for a revision to freeze. An untouched plot is an empty one. */
export async function rigPlot(db: Db, scope: Scope, rigId: string): Promise<PlotAnswer> {
  const plot = await findRigPlot(db, scope, rigId)
  if (!plot) return { rigId, sequence: 0, document: emptyDocument }
  return { rigId, ...(await loadPlot(db, scope, plot.id)) }
}

export async function readPlot(actor: Actor, input: { rigId: string }): Promise<PlotAnswer> {
  assertCan(actor, 'party:read')
  return db().transaction(
    async (tx) => {
      if (!(await rigExists(tx, actor, input.rigId))) throw noSuchRig()
      return rigPlot(tx, actor, input.rigId)
    },
    // Snapshot and log are two reads; they must be of one moment.
    { isolationLevel: 'repeatable read', accessMode: 'read only' },
  )
}

/** What happened on the plot after a sequence that the reader has seen. */
export async function readMissedCommands(
  actor: Actor,
  input: { rigId: string; after: number },
): Promise<MissedCommands> {
  assertCan(actor, 'party:read')
  return db().transaction(
    async (tx) => {
      if (!(await rigExists(tx, actor, input.rigId))) throw noSuchRig()
      const plot = await findRigPlot(tx, actor, input.rigId)
      return plot
        ? missedCommands(tx, actor, { plot, after: input.after })
        : { sequence: 0, missed: input.after === 0 ? [] : null }
    },
    { isolationLevel: 'repeatable read', accessMode: 'read only' },
  )
}

/** Null `missed` for a reader too far behind, or ahead of the log (a restored database): read the document again. */
export async function missedCommands(
  db: Db,
  scope: Scope,
  input: { plot: { id: string; sequence: number }; after: number },
): Promise<MissedCommands> {
  const { plot, after } = input
  if (after > plot.sequence || plot.sequence - after > MISSED_LIMIT) return { sequence: plot.sequence, missed: null }
  const rows = await listCommandsAfter(db, scope, { plotId: plot.id, after, limit: MISSED_LIMIT })
  return {
    sequence: plot.sequence,
    missed: rows.map(({ sequence, command, by }) => ({ sequence, command: command as PlotCommand, by })),
  }
}
