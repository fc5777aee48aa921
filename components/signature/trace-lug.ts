/** One lug as the trace shows it. */
export interface TraceLug {
  number: number
  /** Clockwise from twelve o'clock, facing this head, radians. */
  angleRad: number
  /** Reading against target, any unit, high is positive; only its sign is shown. Null: not read yet. */
  offset: number | null
  /** Outside the tolerance. */
  out: boolean
}

export interface TraceMove {
  number: number
  turn: 'tighten' | 'ease'
}

/** The readings as an outline about the target circle of radius 1, x to the right, y downwards; see `traceOutline`. */
export interface TraceOutline {
  /** Pieces of the outline; between them nothing was read and nothing is drawn. */
  segments: readonly (readonly { x: number; y: number }[])[]
  /** One piece that runs all the way round. */
  closed: boolean
  /** Where each lug that was read lies on the outline. */
  lugs: readonly { x: number; y: number }[]
}
