import { membersSchema } from '@/lib/contracts/member'
import { defineRoute } from '@/lib/server/http/define-route'
import { readMembers } from '@/lib/server/members/list-members'

export const GET = defineRoute({ response: membersSchema, handler: ({ actor }) => readMembers(actor) })
