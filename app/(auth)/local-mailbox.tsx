/** On a set-up of one's own no mail leaves the machine; this is where it lies. */
export function LocalMailbox({ url }: { url: string | undefined }) {
  if (!url) return null
  return (
    <p className="mt-6 border-t border-line pt-4 text-sm text-soft">
      This is a local set-up: no mail leaves this machine.{' '}
      <a href={url} className="font-bold text-ink underline underline-offset-4">
        Open the local mailbox
      </a>
    </p>
  )
}
