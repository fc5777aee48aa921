/** Why a gauge's pairs, or a question put to its calibration, are refused. */
export type GaugeRefusal = 'quantity' | 'too-few' | 'narrow' | 'contradict'

/**
 * A calibration that cannot be made, or a figure that no gauge or head can have. The message is fit to show.
 * `quantity`: a figure out of its range, such as inches given in metres; `field` names it.
 * `too-few`: fewer than three pairs. `narrow`: all pairs at nearly one tension. `contradict`: the readings do not rise with
 * the tension, or scatter too much to say. `pairs` holds the places, in the list that was given, of the pairs it speaks of.
 */
export class GaugeError extends RangeError {
  readonly reason: GaugeRefusal
  readonly field: string
  readonly pairs: readonly number[]

  constructor(reason: GaugeRefusal, field: string, message: string, pairs: readonly number[] = []) {
    super(message)
    this.name = 'GaugeError'
    this.reason = reason
    this.field = field
    this.pairs = pairs
  }
}
