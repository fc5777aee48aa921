import type { ServerResponse } from 'node:http'

/** What a request gets back. */
export interface Answer {
  status: number
  headers?: Record<string, string>
  body?: string | Uint8Array
}

export const json = (status: number, value: unknown): Answer => ({
  status,
  headers: { 'content-type': 'application/json; charset=utf-8' },
  body: JSON.stringify(value),
})

export const html = (status: number, text: string, headers: Record<string, string> = {}): Answer => ({
  status,
  headers: { 'content-type': 'text/html; charset=utf-8', ...headers },
  body: text,
})

export const seeOther = (location: string): Answer => ({ status: 303, headers: { location } })

export function give(response: ServerResponse, { status, headers = {}, body }: Answer): void {
  response.writeHead(status, {
    'cache-control': 'no-store',
    'x-content-type-options': 'nosniff',
    'referrer-policy': 'no-referrer',
    ...headers,
  })
  response.end(body)
}
