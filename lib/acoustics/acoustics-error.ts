/**
 * A quantity the model refuses: not a number, not finite, or outside what a drum can be.
 * `field` names the input as the caller spelled it, so that a form can stand the message beside it.
 */
export class AcousticsError extends RangeError {
  readonly field: string

  constructor(field: string, message: string) {
    super(message)
    this.name = 'AcousticsError'
    this.field = field
  }
}
