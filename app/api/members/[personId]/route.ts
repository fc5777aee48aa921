import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { changedMemberSchema, removeMemberSchema, updateMemberSchema } from '@/lib/contracts/member'
import { doneSchema } from '@/lib/contracts/sign-in'
import { defineRoute } from '@/lib/server/http/define-route'
import { changeMemberRoles, removeMember } from '@/lib/server/members/change-member'

const params = z.object({ personId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateMemberSchema,
  response: changedMemberSchema,
  handler: ({ actor, params: { personId }, body }) => changeMemberRoles(actor, { personId, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeMemberSchema,
  response: doneSchema,
  async handler({ actor, params: { personId }, body }) {
    await removeMember(actor, { personId, ...body })
    return { done: true as const }
  },
})
