import pino from 'pino'

/** Structured logs. Only ids and codes are logged, never names, addresses, tokens or bodies; the redaction is a second net. */
export const log = pino({
  level: process.env['LOG_LEVEL'] ?? 'info',
  base: { service: 'hoopwright', process: process.env['HOOPWRIGHT_PROCESS'] ?? 'app' },
  redact: {
    paths: ['email', 'name', 'token', 'password', 'to', 'address', '*.email', '*.name', '*.token', '*.password', '*.to', '*.address'],
    remove: true,
  },
  serializers: {
    // A driver's error can carry the row it choked on; its kind, code and place are enough.
    error: (error: unknown) => describe(error),
  },
})

function describe(error: unknown, depth = 0): unknown {
  if (!(error instanceof Error)) return { type: typeof error }
  const code = 'code' in error ? String(error.code) : undefined
  return {
    type: error.name,
    code,
    constraint: 'constraint' in error ? error.constraint : undefined,
    stack: error.stack?.split('\n').filter((line) => /^\s+at /.test(line)).slice(0, 8),
    cause: error.cause && depth < 3 ? describe(error.cause, depth + 1) : undefined,
  }
}
