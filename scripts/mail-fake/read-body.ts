import type { IncomingMessage } from 'node:http'

/** The whole body of a request, or null when it is larger than allowed. */
export async function readBody(request: IncomingMessage, mostBytes: number): Promise<Buffer | null> {
  const parts: Buffer[] = []
  let size = 0
  for await (const part of request as AsyncIterable<Buffer>) {
    size += part.length
    // What is too large is still read to its end, so that the sender hears the refusal.
    if (size <= mostBytes) parts.push(part)
  }
  return size > mostBytes ? null : Buffer.concat(parts)
}
