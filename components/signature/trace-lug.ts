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
