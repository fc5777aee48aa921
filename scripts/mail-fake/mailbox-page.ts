import { attachmentPath } from './mailbox-api'
import { mailboxStyle } from './mailbox-style'
import type { Fate, MailEvent, StoredMail } from './stored-mail'
import { lastEventOf } from './stored-mail'

const escape = (text: string): string =>
  text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;').replaceAll("'", '&#39;')

const moment = (iso: string): string => `<time datetime="${escape(iso)}">${escape(iso.slice(0, 19).replace('T', ' '))} UTC</time>`

const size = (bytes: number): string => (bytes < 1000 ? `${bytes} B` : bytes < 1_000_000 ? `${Math.round(bytes / 1000)} kB` : `${(bytes / 1_000_000).toFixed(1)} MB`)

const FATE_WORDS: Record<Fate, string> = {
  'email.delivered': 'delivered',
  'email.bounced': 'bounced: no such address',
  'email.complained': 'reported as spam by its reader',
}

function page(title: string, body: string): string {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escape(title)}</title>
<style>${mailboxStyle}</style>
</head>
<body><main>${body}</main></body>
</html>`
}

export function listPage(mails: StoredMail[]): string {
  const rows = mails.map((mail) => {
    const attachments = mail.attachments.length > 0 ? ` · ${mail.attachments.length === 1 ? '1 attachment' : `${mail.attachments.length} attachments`}` : ''
    const state = lastEventOf(mail)
    return `<li><a class="${escape(state)}" href="/mail/${mail.id}"><strong>${escape(mail.subject)}</strong>
<span>to ${escape(mail.to.join(', '))}</span><span>from ${escape(mail.from)} · ${moment(mail.createdAt)} · ${escape(state)}${attachments}</span></a></li>`
  })
  const list =
    rows.length > 0
      ? `<ul class="mails">${rows.join('\n')}</ul>`
      : '<p>No mail yet. Send a pack, invite somebody or ask for a sign-in link, and it lands here.</p>'
  return page(
    'Mailbox',
    `<h1>Mailbox</h1>
<p class="soft">Every mail that this Hoopwright sends ends here, whoever it is for. Nothing leaves this machine.</p>
<p id="news" role="status" hidden>New mail has come. <a href="/">Show it</a></p>
${list}
<script src="/mailbox.js" defer></script>`,
  )
}

/** Tells the reader of the list that there is more, without pulling the page from under them. */
export const listScript = `
new EventSource('/api/live').addEventListener('mail', () => { document.getElementById('news').hidden = false })
`

function eventRow({ type, at, webhook, answer }: MailEvent): string {
  const told = webhook === 'taken' ? 'the app has taken it' : webhook === 'waiting' ? 'not told to the app yet' : 'the app did not take it'
  return `<li>${moment(at)} ${FATE_WORDS[type]} · ${told}${answer === null ? '' : ` (${escape(answer)})`}</li>`
}

export function mailPage(mail: StoredMail): string {
  const rows: [string, string[]][] = [
    ['From', [mail.from]],
    ['To', mail.to],
    ['Copy', mail.cc],
    ['Blind copy', mail.bcc],
    ['Reply to', mail.replyTo],
    ...Object.entries(mail.headers).map(([name, value]): [string, string[]] => [name, [value]]),
  ]
  const particulars = rows
    .filter(([, values]) => values.length > 0)
    .map(([name, values]) => `<dt>${escape(name)}</dt><dd>${escape(values.join(', '))}</dd>`)
  const attachments = mail.attachments.map(
    ({ filename, sizeBytes, contentType }, index) =>
      `<li><a href="${attachmentPath(mail, index)}" target="_blank">Open ${escape(filename)}</a> <span class="soft">${size(sizeBytes)}, ${escape(contentType)}</span> · <a href="${attachmentPath(mail, index)}?download" download="${escape(filename)}">Download ${escape(filename)}</a></li>`,
  )
  return page(
    mail.subject,
    `<p><a href="/">Back to the mailbox</a></p>
<h1>${escape(mail.subject)}</h1>
<dl>${particulars.join('')}<dt>Sent</dt><dd>${moment(mail.createdAt)}</dd></dl>
${attachments.length > 0 ? `<h2>Attachments</h2><ul class="plain">${attachments.join('')}</ul>` : ''}
${
  mail.html === null
    ? ''
    : `<h2>The mail</h2><iframe title="The mail as its reader sees it" sandbox="allow-scripts allow-popups allow-popups-to-escape-sandbox" src="/mail/${mail.id}/html"></iframe>`
}
${mail.text === null ? '' : `<h2>As plain text</h2><pre>${escape(mail.text)}</pre>`}
<h2>What became of it</h2>
<ul class="plain">${mail.events.map(eventRow).join('')}</ul>
<p class="soft">Tell the app that this mail was, as the mail service would:</p>
<form class="fates" method="post" action="/mail/${mail.id}/events">
<button name="type" value="email.delivered">Say delivered</button>
<button name="type" value="email.bounced">Say bounced</button>
<button name="type" value="email.complained">Say reported as spam</button>
</form>`,
  )
}

export function missingPage(): string {
  return page('Not there', '<h1>This is not in the mailbox</h1><p><a href="/">Back to the mailbox</a></p>')
}

/** The mail's own HTML as it is put into the frame: its links open in a new tab, its inline pictures come from its attachments. */
export function framedHtml(mail: StoredMail): string {
  const withPictures = mail.attachments.reduce(
    (text, { contentId }, index) => (contentId === null ? text : text.replaceAll(`cid:${contentId}`, attachmentPath(mail, index))),
    mail.html ?? '',
  )
  const base = '<base target="_blank">'
  return /<head[^>]*>/i.test(withPictures) ? withPictures.replace(/<head[^>]*>/i, (head) => `${head}${base}`) : `${base}${withPictures}`
}
