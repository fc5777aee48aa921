import type { NoteLocale } from '@/lib/acoustics/note-name'

/** The language in which a reader names notes, from a language tag; English where no other is known. */
export function noteLocale(tag: string): NoteLocale {
  const language = tag.toLowerCase().split('-')[0]
  return language === 'de' || language === 'fr' ? language : 'en'
}
