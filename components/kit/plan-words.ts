import type { HeadCaution } from '@/lib/acoustics/head-cautions'

export const cautionWords: Record<HeadCaution, string> = {
  slack: 'Under its playable range: the head may not hold the note.',
  choked: 'Over its playable range: ease down. Film or a rod may let go.',
  'film-stress': 'The film is pulled harder than this kind of head should be: ease down and keep faces clear.',
}
