/** A refusal in the shape the mail provider gives it. */
export class ProviderError extends Error {
  constructor(
    readonly statusCode: number,
    readonly code: string,
    message: string,
  ) {
    super(message)
    this.name = 'ProviderError'
  }

  toJSON() {
    return { statusCode: this.statusCode, name: this.code, message: this.message }
  }
}
