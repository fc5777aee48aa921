import { createHash, randomUUID } from 'node:crypto'
import type { IncomingMessage } from 'node:http'
import type { Answer } from './answer'
import { json } from './answer'
import type { FateTeller } from './fate-teller'
import type { MailStore } from './mail-store'
import { ProviderError } from './provider-error'
import { readBody } from './read-body'
import { MOST_BYTES, parseSendRequest } from './send-request'
import type { StoredMail } from './stored-mail'
import { lastEventOf } from './stored-mail'

const LONGEST_KEY = 256

interface Parts {
  store: MailStore
  teller: FateTeller
  apiKey: string
  onMail: (mail: StoredMail) => void
}

function checkKey(request: IncomingMessage, apiKey: string): void {
  const given = /^Bearer (.+)$/.exec(request.headers.authorization ?? '')?.[1]
  if (given === undefined) throw new ProviderError(401, 'missing_api_key', 'Missing API key in the authorization header.')
  if (given !== apiKey) throw new ProviderError(403, 'invalid_api_key', 'API key is invalid.')
}

function idempotencyKey(request: IncomingMessage): string | null {
  const key = request.headers['idempotency-key']
  if (key === undefined) return null
  if (typeof key === 'string' && key.length >= 1 && key.length <= LONGEST_KEY) return key
  throw new ProviderError(400, 'invalid_idempotency_key', `The idempotency key has to be 1 to ${LONGEST_KEY} characters long.`)
}

async function readJson(request: IncomingMessage): Promise<{ bytes: Buffer; value: unknown }> {
  const bytes = await readBody(request, MOST_BYTES)
  if (bytes === null) throw new ProviderError(413, 'validation_error', `A mail may be ${MOST_BYTES / 1024 / 1024} MB at most, attachments included.`)
  try {
    return { bytes, value: JSON.parse(bytes.toString('utf8')) }
  } catch {
    throw new ProviderError(400, 'validation_error', 'The request body is not JSON.')
  }
}

async function accept(request: IncomingMessage, { store, teller, onMail }: Parts): Promise<Answer> {
  const key = idempotencyKey(request)
  const { bytes, value } = await readJson(request)
  const wanted = parseSendRequest(value)
  const bodyHash = createHash('sha256').update(bytes).digest('hex')
  const now = new Date()
  const earlier = key === null ? undefined : store.byIdempotencyKey(key, now)
  if (earlier) {
    if (earlier.idempotency?.bodyHash === bodyHash) return json(200, { id: earlier.id })
    throw new ProviderError(409, 'invalid_idempotent_request', 'This idempotency key was used within the last 24 hours with another request body.')
  }
  const id = randomUUID()
  const mail: StoredMail = {
    id,
    messageId: `<${id}@mailbox.example>`,
    createdAt: now.toISOString(),
    from: wanted.from,
    to: wanted.to,
    cc: wanted.cc,
    bcc: wanted.bcc,
    replyTo: wanted.reply_to,
    subject: wanted.subject,
    html: wanted.html ?? null,
    text: wanted.text ?? null,
    headers: wanted.headers,
    tags: wanted.tags,
    attachments: wanted.attachments.map(({ filename, contentType, contentId, bytes: content }) => ({
      filename,
      contentType,
      contentId,
      sizeBytes: content.length,
    })),
    idempotency: key === null ? null : { key, bodyHash },
    events: [],
  }
  const event = teller.newEvent(teller.fateOf(mail), now)
  mail.events.push(event)
  store.add(
    mail,
    wanted.attachments.map(({ bytes: content }) => content),
  )
  teller.schedule(mail, event)
  onMail(mail)
  return json(200, { id })
}

function show(mail: StoredMail): Answer {
  const orNull = (list: string[]) => (list.length > 0 ? list : null)
  return json(200, {
    object: 'email',
    id: mail.id,
    message_id: mail.messageId,
    created_at: mail.createdAt,
    from: mail.from,
    to: mail.to,
    cc: orNull(mail.cc),
    bcc: orNull(mail.bcc),
    reply_to: orNull(mail.replyTo),
    subject: mail.subject,
    html: mail.html,
    text: mail.text,
    tags: mail.tags,
    last_event: lastEventOf(mail),
    scheduled_at: null,
  })
}

/** The part of the mail provider's HTTP API that this app calls; null for a path that is not the provider's. */
export async function answerAsProvider(request: IncomingMessage, path: string, parts: Parts): Promise<Answer | null> {
  const [, id] = /^\/emails(?:\/([^/]+))?$/.exec(path) ?? []
  if (path !== '/emails' && id === undefined) return null
  try {
    checkKey(request, parts.apiKey)
    if (request.method === 'POST' && id === undefined) return await accept(request, parts)
    if (request.method === 'GET' && id !== undefined) {
      const mail = parts.store.get(id)
      if (mail) return show(mail)
      throw new ProviderError(404, 'not_found', 'Email not found')
    }
    throw new ProviderError(405, 'method_not_allowed', 'The local mailbox does not offer this.')
  } catch (error) {
    if (error instanceof ProviderError) return json(error.statusCode, error)
    throw error
  }
}
