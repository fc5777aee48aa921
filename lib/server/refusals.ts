import { AppError } from '@/lib/errors'

/** Refusals that many use cases share. `what` is the thing as the reader knows it: "show", "venue". */
export function notThere(what: string): AppError {
  return new AppError(
    'not-found',
    `There is no such ${what} in this party; it may have been taken away. Nothing was changed.`,
  )
}

export function fieldFault(field: string, message: string): AppError {
  return new AppError('invalid', `Please check ${field}: ${message}. Nothing was changed.`, {
    details: { fields: { [field]: message } },
  })
}

export function stillInUse(message: string): AppError {
  return new AppError('conflict', `${message} Nothing was changed.`)
}

/** The row as it was changed; otherwise it is gone, or somebody was quicker, and the refusal carries what stands now. */
export async function changedOr<Row>(
  what: string,
  changed: Row | undefined,
  current: () => Promise<Row | undefined>,
): Promise<Row> {
  if (changed !== undefined) return changed
  const row = await current()
  if (row === undefined) throw notThere(what)
  throw new AppError(
    'stale',
    `This ${what} was changed by somebody else meanwhile. What you typed is kept; compare and save again.`,
    {
      details: { current: row },
    },
  )
}

/** A create whose id is there already: the same request again answers the row; an id that is somebody else's is refused. */
export function thereAlready<Row>(row: Row | undefined): Row {
  if (row !== undefined) return row
  throw new AppError('conflict', 'This id is taken already; send it again with a new one. Nothing was changed.')
}
