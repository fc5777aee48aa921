import { apply } from './apply'
import type { PlotCommand } from './command'
import type { PlotDocument } from './document'

/** A document at a place in the command log. */
export interface PlotSnapshot {
  readonly sequence: number
  readonly document: PlotDocument
}

export interface SequencedCommand {
  readonly sequence: number
  readonly command: PlotCommand
}

/** A snapshot is kept every this many commands, so that opening a plot folds fewer than this. */
export const SNAPSHOT_EVERY = 100

/**
 * The document after the log's commands. They follow on the snapshot one by one; throws RangeError on a gap or a
 * repeat, because a drawing folded from half a log would be wrong without looking wrong.
 */
export function foldCommands(snapshot: PlotSnapshot, log: readonly SequencedCommand[]): PlotSnapshot {
  let { document, sequence } = snapshot
  for (const entry of log) {
    if (entry.sequence !== sequence + 1)
      throw new RangeError(`The command log goes from ${sequence} to ${entry.sequence}`)
    document = apply(document, entry.command)
    sequence = entry.sequence
  }
  return { document, sequence }
}
