import type { HeadCaution } from '@/lib/acoustics/head-estimate'
import type { NoteWarning } from '@/lib/tuning/note-plan'

/** A warning of the plan in words; `nameOf` names the other drums. */
export function warningWords(warning: NoteWarning, above: boolean, nameOf: (id: string) => string): string {
  switch (warning.kind) {
    case 'below-range':
      return 'below its range: the head goes slack'
    case 'above-range':
      return 'above its range: the head chokes'
    case 'off-middle':
      return above ? 'high in its range, above the middle' : 'low in its range, below the middle'
    case 'shared-note':
      return `sounds the same note as ${warning.withDrumIds.map(nameOf).join(' and ')}`
  }
}

export const cautionWords: Record<HeadCaution, string> = {
  slack: 'Under its playable range: the head may not hold the note.',
  choked: 'Over its playable range: ease down. Film or a rod may let go.',
  'film-stress': 'The film is pulled harder than this kind of head should be: ease down and keep faces clear.',
}
