import { z } from 'zod'
import type { Role } from './common'
import { emailSchema, idSchema, roleSchema, versionSchema } from './common'

/** A member's roles: a set, at least one. */
export const roleSetSchema = z
  .array(roleSchema)
  .min(1, 'choose at least one role')
  .max(4, 'each role once')
  .refine((given) => new Set(given).size === given.length, 'each role once')

export const updateMemberSchema = z.object({ version: versionSchema, roles: roleSetSchema })
export const removeMemberSchema = z.object({ version: versionSchema })

export const changedMemberSchema = z.object({ personId: idSchema, roles: z.array(roleSchema), version: versionSchema })

export const lentRoleSchema = z.object({
  id: idSchema,
  role: roleSchema,
  untilAt: z.iso.datetime(),
  lentBy: z.string(),
  /** Whether the reader may end it before its time. */
  mayEnd: z.boolean(),
})
export type LentRole = z.infer<typeof lentRoleSchema>

export const memberSchema = z.object({
  personId: idSchema,
  name: z.string(),
  email: z.string(),
  roles: z.array(roleSchema),
  lent: z.array(lentRoleSchema),
  version: versionSchema,
})
export type MemberView = z.infer<typeof memberSchema>

export const membersSchema = z.object({
  members: z.array(memberSchema),
  /** Roles the reader may lend. */
  mayLend: z.array(roleSchema),
})
export type Members = z.infer<typeof membersSchema>

export const inviteSchema = z.object({ id: idSchema.optional(), email: emailSchema, roles: roleSetSchema })
export type Invite = z.infer<typeof inviteSchema>

export const invitationSchema = z.object({
  id: idSchema,
  email: z.string(),
  roles: z.array(roleSchema),
  invitedBy: z.string(),
  createdAt: z.iso.datetime(),
  expiresAt: z.iso.datetime(),
  expired: z.boolean(),
})
export type InvitationView = z.infer<typeof invitationSchema>
export const invitationsSchema = z.object({ invitations: z.array(invitationSchema) })

/** The longest a role may be lent, days. */
export const longestLoanDays = 31

export const lendRoleSchema = z.object({
  id: idSchema.optional(),
  personId: idSchema,
  role: roleSchema,
  untilAt: z.iso.datetime({ offset: true, error: 'choose when it ends' }),
})
export type LendRole = z.infer<typeof lendRoleSchema>

/** The owner's role passes only from an owner in their own right: a stand-in must not make itself permanent. */
export function mayGiveRoles(ownRoles: readonly Role[], given: readonly Role[]): boolean {
  return !given.includes('owner') || ownRoles.includes('owner')
}

/** What a member may lend: an owner any role, others the ones they hold in their own right, if these may be lent at all. */
export function lendableRoles(ownRoles: readonly Role[]): Role[] {
  if (ownRoles.includes('owner')) return ['owner', 'drum-tech', 'tour-manager', 'viewer']
  return ownRoles.filter((role) => role === 'drum-tech' || role === 'tour-manager')
}

/** One line of the audit trail, as it is read. */
export const auditLineSchema = z.object({
  id: z.number().int(),
  at: z.iso.datetime(),
  who: z.string(),
  sentence: z.string(),
  address: z.string(),
})
export type AuditLine = z.infer<typeof auditLineSchema>

export const auditQuerySchema = z.object({
  before: z.coerce.number().int().min(1).optional(),
  person: idSchema.optional(),
  action: z
    .string()
    .regex(/^[a-z-]+(\.[a-z-]+)*$/, 'choose an action from the list')
    .max(60)
    .optional(),
})
export type AuditQuery = z.infer<typeof auditQuerySchema>

export const auditPageSchema = z.object({
  lines: z.array(auditLineSchema),
  /** The `before` of the next page, or null on the last. */
  older: z.number().int().nullable(),
})
