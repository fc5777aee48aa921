/** A short letter in our own hand: greeting, paragraphs, one thing to do. Every mail of ours is one. */
export type Letter = {
  greeting: string
  paragraphs: string[]
  action?: { label: string; href: string }
  closing?: string
}

export function letterText(letter: Letter): string {
  return [
    letter.greeting,
    ...letter.paragraphs,
    ...(letter.action ? [`${letter.action.label}:\n${letter.action.href}`] : []),
    ...(letter.closing ? [letter.closing] : []),
  ].join('\n\n')
}

function escape(text: string): string {
  return text.replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`)
}

export function letterHtml(letter: Letter): string {
  const paragraph = (text: string) => `<p style="margin:0 0 16px">${escape(text).replace(/\n/g, '<br>')}</p>`
  const action = letter.action
    ? `<p style="margin:24px 0"><a href="${escape(letter.action.href)}" style="background:#1b1813;color:#fffdf8;padding:14px 22px;text-decoration:none;font-weight:bold;display:inline-block">${escape(letter.action.label)}</a></p>`
    : ''
  return `<!doctype html><html><body style="margin:0;background:#f5f2ea;color:#1b1813;font:16px/1.5 Verdana,Arial,sans-serif">
<div style="max-width:560px;margin:0 auto;padding:32px 24px;background:#fffdf8;border-top:4px solid #1b1813">
${paragraph(letter.greeting)}${letter.paragraphs.map(paragraph).join('')}${action}${letter.closing ? paragraph(letter.closing) : ''}
</div></body></html>`
}
