import { AppError } from '@/lib/errors'

/** Reads a JSON body up to a size; a longer one is refused before it is held. */
export async function readJson(request: Request, maxBytes: number): Promise<unknown> {
  const text = await readText(request, maxBytes)
  if (!request.headers.get('content-type')?.toLowerCase().startsWith('application/json')) {
    throw new AppError('invalid', 'Send this as JSON (Content-Type: application/json).')
  }
  try {
    return JSON.parse(text) as unknown
  } catch (cause) {
    throw new AppError('invalid', 'The request is not readable JSON. Nothing was changed.', { cause })
  }
}

export async function readText(request: Request, maxBytes: number): Promise<string> {
  const tooLarge = () =>
    new AppError('too-large', `That is more than this takes at once (${Math.floor(maxBytes / 1024)} kB). Nothing was changed.`)
  if (Number(request.headers.get('content-length') ?? 0) > maxBytes) throw tooLarge()
  if (!request.body) return ''
  const chunks: Uint8Array[] = []
  let size = 0
  const reader = request.body.getReader()
  for (;;) {
    const { done, value } = await reader.read()
    if (done) break
    size += value.byteLength
    if (size > maxBytes) {
      await reader.cancel()
      throw tooLarge()
    }
    chunks.push(value)
  }
  return Buffer.concat(chunks).toString('utf8')
}
