import type { Role } from '@/lib/contracts/common'
import { roleWords, roles } from '@/lib/contracts/common'

type Detail = Record<string, unknown>

const text = (detail: Detail, key: string) => {
  const value = detail[key]
  return typeof value === 'string' || typeof value === 'number' ? String(value) : ''
}

function roleList(value: unknown): string {
  const known = (Array.isArray(value) ? value : [value]).filter((role): role is Role => (roles as readonly unknown[]).includes(role))
  return known.map((role) => roleWords[role]).join(', ') || 'no role'
}

const settingWords: Record<string, string> = {
  name: 'name',
  units: 'units',
  referenceHz: 'A4 in Hz',
  paper: 'paper',
  locale: 'note names',
}

function settings(detail: Detail): string {
  const changed = detail['changed']
  const entries = changed && typeof changed === 'object' ? Object.entries(changed) : []
  return entries.map(([key, value]) => `${settingWords[key] ?? key} ${String(value)}`).join(', ') || 'nothing'
}

const sentences: Record<string, (detail: Detail) => string> = {
  'party.create': (detail) => `made the party ${text(detail, 'name')}`,
  'party.change': (detail) => `changed the settings of the party: ${settings(detail)}`,
  'member.change-roles': (detail) =>
    `changed the roles of ${text(detail, 'name')} from ${roleList(detail['before'])} to ${roleList(detail['after'])}`,
  'member.remove': (detail) => `took ${text(detail, 'name')} out of the party`,
  'invitation.send': (detail) => `invited ${text(detail, 'email')} as ${roleList(detail['roles'])}`,
  'invitation.send-again': (detail) => `sent the invitation to ${text(detail, 'email')} again`,
  'invitation.withdraw': (detail) => `withdrew the invitation to ${text(detail, 'email')}`,
  'invitation.accept': (detail) => `joined the party as ${roleList(detail['roles'])}`,
  'stand-in.lend': (detail) =>
    `lent ${text(detail, 'name')} the role ${roleList(detail['role'])} until ${text(detail, 'untilAt').slice(0, 16).replace('T', ' ')} UTC`,
  'stand-in.end': (detail) => `ended the loan of the role ${roleList(detail['role'])} to ${text(detail, 'name')}`,
  'session.start': () => 'signed in',
  'session.end': () => 'signed out one device',
  'session.end-all': (detail) => `signed out everywhere, on ${text(detail, 'count')} devices`,
}

/**
 * What was done, to stand behind the name of who did it. An action without a sentence of its own is told by its own
 * words, thing first, with whatever name the record kept.
 */
export function auditSentence(action: string, detail: unknown): string {
  const record: Detail = detail && typeof detail === 'object' ? (detail as Detail) : {}
  const own = sentences[action]
  if (own) return own(record)
  const name = ['name', 'title', 'number', 'email'].map((key) => text(record, key)).find(Boolean)
  return `${action.replace(/[.-]/g, ' ')}${name ? `: ${name}` : ''}`
}

/** An action's name in the filter. */
export function actionWords(action: string): string {
  return action.replace(/\./g, ': ').replace(/-/g, ' ')
}
