import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { doneSchema } from '@/lib/contracts/sign-in'
import { definePersonRoute } from '@/lib/server/http/define-person-route'
import { endDevice } from '@/lib/server/people/devices'

export const DELETE = definePersonRoute({
  params: z.object({ id: idSchema }),
  response: doneSchema,
  async handler({ person, params }) {
    await endDevice(person, params.id)
    return { done: true as const }
  },
})
