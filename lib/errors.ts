/** Every way a request can be refused. The message is fit to show; the cause is for the log. */
export const errorCodes = [
  'signed-out',
  'forbidden',
  'not-found',
  'stale',
  'conflict',
  'gone',
  'too-large',
  'invalid',
  'rate-limited',
  'unavailable',
  'internal',
] as const
export type ErrorCode = (typeof errorCodes)[number]

export class AppError extends Error {
  readonly code: ErrorCode
  /** Data the client can act on: field messages, the current row, missed commands. */
  readonly details: Record<string, unknown> | undefined

  constructor(code: ErrorCode, message: string, options: { details?: Record<string, unknown>; cause?: unknown } = {}) {
    super(message, { cause: options.cause })
    this.name = 'AppError'
    this.code = code
    this.details = options.details
  }
}
