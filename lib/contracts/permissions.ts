import type { Role } from './common'

/** Who may do what, in one table. A link's permissions stand below it. */
const table = {
  'party:read': ['owner', 'drum-tech', 'tour-manager', 'viewer'],
  'party:manage': ['owner'],
  'member:manage': ['owner'],
  'role:lend': ['owner', 'drum-tech', 'tour-manager'],
  'audit:read': ['owner'],
  'player:edit': ['drum-tech', 'tour-manager'],
  'kit:edit': ['drum-tech'],
  'gauge:edit': ['drum-tech'],
  'plot:edit': ['drum-tech'],
  'patch:edit': ['drum-tech'],
  'revision:issue': ['drum-tech'],
  'pack:preview': ['drum-tech', 'tour-manager'],
  'tour:edit': ['tour-manager'],
  'rig:edit': ['drum-tech', 'tour-manager'],
  'show:edit': ['tour-manager'],
  'directory:edit': ['tour-manager'],
  'hire:edit': ['tour-manager'],
  'advance:send': ['tour-manager'],
  'answer:take-down': ['tour-manager'],
  'answer:settle': ['tour-manager'],
  'link:withdraw': ['tour-manager', 'drum-tech'],
  'bench:print': ['drum-tech', 'tour-manager'],
  'bench:log': ['drum-tech'],
} as const satisfies Record<string, readonly Role[]>

export type Permission = keyof typeof table
export const permissions = Object.keys(table) as Permission[]

export function rolesMay(roles: readonly Role[], permission: Permission): boolean {
  const allowed: readonly Role[] = table[permission]
  return roles.some((role) => allowed.includes(role))
}

/** The roles that hold a permission, for the sentence that says who can help. */
export function rolesWith(permission: Permission): readonly Role[] {
  return table[permission]
}
