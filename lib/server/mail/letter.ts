/**
 * A short letter in our own hand: greeting, paragraphs, one thing to do. Every mail of ours is one. Only the address of
 * its action may hold a link place: names that people chose stand in all the rest, and a place typed into one of them
 * must never be filled with a secret.
 */
export type Letter = {
  greeting: string
  paragraphs: string[]
  action?: { label: string; href: string }
  closing?: string
}

export function letterText(letter: Letter): string {
  return [
    plain(letter.greeting),
    ...letter.paragraphs.map(plain),
    ...(letter.action ? [`${plain(letter.action.label)}:\n${letter.action.href}`] : []),
    ...(letter.closing ? [plain(letter.closing)] : []),
  ].join('\n\n')
}

/** Words with no place in them that sending would fill. */
function plain(text: string): string {
  return text.replace(/\{(?=\{)/g, '{ ')
}

function escape(text: string): string {
  return text.replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`)
}

export function letterHtml(letter: Letter): string {
  const paragraph = (text: string) => `<p style="margin:0 0 16px">${escape(plain(text)).replace(/\n/g, '<br>')}</p>`
  const action = letter.action
    ? `<p style="margin:24px 0"><a href="${escape(letter.action.href)}" style="background:#1b1813;color:#fffdf8;padding:14px 22px;text-decoration:none;font-weight:bold;display:inline-block">${escape(plain(letter.action.label))}</a></p>`
    : ''
  return `<!doctype html><html lang="en"><body style="margin:0;background:#f5f2ea;color:#1b1813;font:16px/1.5 Verdana,Arial,sans-serif">
<div style="max-width:560px;margin:0 auto;padding:32px 24px;background:#fffdf8;border-top:4px solid #1b1813">
${paragraph(letter.greeting)}${letter.paragraphs.map(paragraph).join('')}${action}${letter.closing ? paragraph(letter.closing) : ''}
</div></body></html>`
}
