import { buttonClasses } from '@/components/ui/button-classes'
import { Notice } from '@/components/ui/notice'
import type { PackState } from '@/lib/contracts/pack'

/** How far a pack's PDF is, and the way to it. */
export function PdfState({ state }: { state: PackState }) {
  if (state.pdf === 'ready' && !state.mayOpen) {
    return (
      <Notice kind="info" word="PDF kept">
        It was sent, and holds the link that answers in its reader’s name: only a tour manager opens it. The same pack
        stands below, and a preview has a PDF without the link.
      </Notice>
    )
  }
  if (state.pdf === 'ready') {
    return (
      <Notice
        kind="success"
        word="PDF ready"
        action={
          <a className={buttonClasses('primary')} href={`/api/packs/${state.id}/pdf`} target="_blank" rel="noreferrer">
            Open the PDF, {state.pages} {state.pages === 1 ? 'page' : 'pages'}
          </a>
        }
      >
        As its reader gets it.
      </Notice>
    )
  }
  if (state.pdf === 'late') {
    return (
      <Notice kind="error">
        The PDF could not be made. The pack below is kept; go back and preview it again, or take something out of the
        kit first.
      </Notice>
    )
  }
  return <Notice kind="wait">The PDF is being made; this page shows it by itself in a few seconds.</Notice>
}
