import type { PackDocument } from '@/lib/advance/pack-document'
import type { Letter } from '@/lib/server/mail/letter'

/** How many changes a mail spells out; the pack holds them all. */
const mostChanges = 20

/** The mail that carries a pack: who asks what for when, what changed, by when to answer, and the one thing to do. */
export function packLetter(pack: PackDocument, recipient: { name: string }, href: string): { subject: string; letter: Letter } {
  const asked = pack.lines.filter((line) => line.asked).length
  const spec = `${pack.rig}, revision ${pack.revision.number}`
  const when = pack.shows.length === 1 ? (pack.shows[0]?.date ?? '') : `${pack.shows.length} shows, ${pack.shows[0]?.date ?? ''} to ${pack.shows.at(-1)?.date ?? ''}`
  const askWords = asked === 1 ? '1 line' : `${asked} lines`
  const crew = pack.contacts.filter((contact) => contact.duty.includes('tour manager') && contact.email !== '')
  return {
    subject: `${pack.party} asks ${pack.recipient.name}: ${when}, ${spec}`,
    letter: {
      greeting: `Hello ${recipient.name},`,
      paragraphs: [
        `${pack.party} asks ${pack.recipient.name} for the kit of ${when}: ${askWords} of ${spec}.`,
        ...changedParagraph(pack),
        ...(pack.answersDue ? [`Please answer by ${pack.answersDue}.`] : []),
        'The pack is attached as a PDF. With the link below you answer line by line on any phone, without an account; each answer is kept as you go and can be changed until it is settled.',
      ],
      action: { label: actionLabel(pack, asked, askWords), href },
      ...(crew.length > 0 ? { closing: `Questions: ${crew.map(({ name, email }) => `${name}, ${email}`).join('; ')}` } : {}),
    },
  }
}

/** After a change the reader does not answer all lines again, and a mail does not know how many are still open. */
function actionLabel(pack: PackDocument, asked: number, askWords: string): string {
  if (asked === 0) return 'Open the pack'
  return pack.changed ? 'Open your lines' : `Answer ${askWords}`
}

function changedParagraph({ changed }: PackDocument): string[] {
  if (!changed) return []
  if (changed.sentences.length === 0) return [`Nothing changed since revision ${changed.sinceRevision}; all that you answered stands.`]
  const shown = changed.sentences.slice(0, mostChanges).map((sentence) => `– ${sentence}`)
  const rest = changed.sentences.length - shown.length
  return [
    [
      `Changed since revision ${changed.sinceRevision}; only the lines that changed are asked again, what you answered about the rest stands:`,
      ...shown,
      ...(rest > 0 ? [`– and ${rest} more in the pack`] : []),
    ].join('\n'),
  ]
}
