import { roleWords, roles } from '@/lib/contracts/common'
import type { Role } from '@/lib/contracts/common'
import type { Told } from './told'
import { tell } from './told'
import { workSentences } from './work-sentences'

function roleList(value: unknown): string {
  const known = (Array.isArray(value) ? value : [value]).filter((role): role is Role =>
    (roles as readonly unknown[]).includes(role),
  )
  return known.map((role) => roleWords[role]).join(', ') || 'no role'
}

const settingWords: Record<string, string> = {
  name: 'name',
  units: 'units',
  referenceHz: 'A4 in Hz',
  paper: 'paper',
  locale: 'note names',
}

function settings(changed: unknown): string {
  const entries = changed && typeof changed === 'object' ? Object.entries(changed) : []
  return entries.map(([key, value]) => `${settingWords[key] ?? key} ${String(value)}`).join(', ') || 'nothing'
}

const partySentences: Record<string, (told: Told) => string> = {
  'party.create': ({ text }) => `made the party ${text('name')}`,
  'party.change': ({ detail }) => `changed the settings of the party: ${settings(detail['changed'])}`,
  'member.change-roles': ({ text, detail }) =>
    `changed the roles of ${text('name')} from ${roleList(detail['before'])} to ${roleList(detail['after'])}`,
  'member.remove': ({ text }) => `took ${text('name')} out of the party`,
  'invitation.send': ({ text, detail }) => `invited ${text('email')} as ${roleList(detail['roles'])}`,
  'invitation.send-again': ({ text }) => `sent the invitation to ${text('email')} again`,
  'invitation.withdraw': ({ text }) => `withdrew the invitation to ${text('email')}`,
  'invitation.accept': ({ detail }) => `joined the party as ${roleList(detail['roles'])}`,
  'stand-in.lend': ({ text, detail }) =>
    `lent ${text('name')} the role ${roleList(detail['role'])} until ${text('untilAt').slice(0, 16).replace('T', ' ')} UTC`,
  'stand-in.end': ({ text, detail }) => `ended the loan of the role ${roleList(detail['role'])} to ${text('name')}`,
  'session.start': () => 'signed in',
  'session.end': () => 'signed out one device',
  'session.end-all': ({ text }) => `signed out everywhere, on ${text('count')} devices`,
  'password.change': () => 'changed their password',
  'password.reset': () => 'set a new password by the mailed link',
}

const sentences = { ...partySentences, ...workSentences }

/**
 * What was done, to stand behind the name of who did it. Names are those of the things as they are called now, by id.
 * An action without a sentence of its own is told by its own words, thing first, with whatever name the record kept.
 */
export function auditSentence(
  action: string,
  detail: unknown,
  subjectId = '',
  names: ReadonlyMap<string, string> = new Map(),
): string {
  const told = tell(detail, subjectId, names)
  const own = sentences[action]
  if (own) return own(told)
  const name = ['name', 'title', 'number', 'email'].map((key) => told.text(key)).find(Boolean)
  return `${action.replace(/[.-]/g, ' ')}${name ? `: ${name}` : ''}`
}

/** An action's name in the filter. */
export function actionWords(action: string): string {
  return action.replace(/\./g, ': ').replace(/-/g, ' ')
}
