import { z } from 'zod'
import { ProviderError } from './provider-error'
import { addressOf } from './stored-mail'

export const MOST_RECIPIENTS = 50
/** Of a whole mail, attachments encoded. */
export const MOST_BYTES = 40 * 1024 * 1024

const ADDRESS = /^[^\s@<>",;]+@[^\s@<>",;]+\.[^\s@<>",;]+$/
const BASE64 = /^(?:[A-Za-z0-9+/]{4})*(?:[A-Za-z0-9+/]{2}==|[A-Za-z0-9+/]{3}=)?$/
const CONTENT_TYPES: Record<string, string> = {
  pdf: 'application/pdf',
  png: 'image/png',
  jpg: 'image/jpeg',
  svg: 'image/svg+xml',
  csv: 'text/csv',
  txt: 'text/plain',
  ics: 'text/calendar',
  zip: 'application/zip',
}

const one = z.string().refine((mailbox) => ADDRESS.test(addressOf(mailbox)), {
  error: 'The email address needs to follow the `email@example.com` or `Name <email@example.com>` format.',
})
const several = z
  .union([one.transform((mailbox) => [mailbox]), z.array(one)])
  .refine((list) => list.length <= MOST_RECIPIENTS, { error: `At most ${MOST_RECIPIENTS} addresses are allowed.` })
const named = z.string().regex(/^[A-Za-z0-9_-]{1,256}$/, {
  error: 'Tags should only contain ASCII letters, numbers, underscores, or dashes, and at most 256 of them.',
})

const attachment = z
  .object({
    content: z.string().regex(BASE64, { error: 'The content has to be base64.' }),
    filename: z.string().min(1).max(255),
    content_type: z.string().optional(),
    content_id: z.string().max(128).optional(),
  })
  .transform(({ content, filename, content_type, content_id }) => {
    const ending = filename.slice(filename.lastIndexOf('.') + 1).toLowerCase()
    return {
      filename,
      contentType: content_type ?? CONTENT_TYPES[ending] ?? 'application/octet-stream',
      contentId: content_id ?? null,
      bytes: Buffer.from(content, 'base64'),
    }
  })

const schema = z
  .object({
    from: one,
    to: several.refine((list) => list.length > 0, { error: 'At least one address is needed.' }),
    cc: several.default([]),
    bcc: several.default([]),
    reply_to: several.default([]),
    subject: z.string().min(1),
    html: z.string().nullish(),
    text: z.string().nullish(),
    headers: z.record(z.string(), z.string()).default({}),
    tags: z.array(z.object({ name: named, value: named })).default([]),
    attachments: z.array(attachment).default([]),
  })
  .refine(({ html, text }) => Boolean(html) || Boolean(text), { path: ['html'], error: 'Missing `html` or `text` field.' })

export type SendRequest = z.infer<typeof schema>

const REQUIRED = ['from', 'to', 'subject']
/** Features of the provider that this app does not use; taking them silently would hide that they do nothing here. */
const UNUSED = ['scheduled_at', 'template', 'topic_id']

/** Checks the body of a mail to be sent. Throws the provider's error for the first fault. */
export function parseSendRequest(body: unknown): SendRequest {
  if (typeof body !== 'object' || body === null || Array.isArray(body)) {
    throw new ProviderError(400, 'validation_error', 'The request body has to be a JSON object.')
  }
  const fields = body as Record<string, unknown>
  for (const name of REQUIRED) {
    if (fields[name] === undefined || fields[name] === '') throw new ProviderError(422, 'missing_required_field', `Missing \`${name}\` field.`)
  }
  for (const name of UNUSED) {
    if (fields[name] !== undefined && fields[name] !== null) {
      throw new ProviderError(422, 'validation_error', `The local mailbox does not know the \`${name}\` field.`)
    }
  }
  const result = schema.safeParse(fields)
  if (result.success) return result.data
  const fault = result.error.issues[0]
  const path = fault?.path.join('.') ?? ''
  const kind = fault?.path[0] === 'attachments' ? 'invalid_attachment' : 'validation_error'
  throw new ProviderError(422, kind, `Invalid \`${path}\` field. ${deepest(fault)}`)
}

/** Of a union's fault, the words of the branch that came closest: the last. */
function deepest(fault: z.core.$ZodIssue | undefined): string {
  if (fault?.code === 'invalid_union') {
    const inner = fault.errors.flat().find((issue) => issue.code === 'custom')
    return inner?.message ?? fault.message
  }
  return fault?.message ?? ''
}
