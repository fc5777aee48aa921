import { Notice } from '@/components/ui/notice'

/** Stands over a kit that belongs to others and must stay as it is. */
export function SharedKitNotice({ owner }: { owner: string | null }) {
  if (owner === null) return null
  return (
    <Notice kind="error" word="Do not retune.">
      This kit is shared and belongs to {owner || 'somebody else'}. Read it if you like, turn nothing, and ask the drum
      tech.
    </Notice>
  )
}
