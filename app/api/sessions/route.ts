import { devicesSchema, doneSchema } from '@/lib/contracts/sign-in'
import { definePersonRoute } from '@/lib/server/http/define-person-route'
import { endAllDevices, listDevices } from '@/lib/server/people/devices'

export const GET = definePersonRoute({
  response: devicesSchema,
  handler: async ({ person }) => ({ devices: await listDevices(person) }),
})

/** Signs out everywhere, this device too. */
export const DELETE = definePersonRoute({
  response: doneSchema,
  async handler({ person }) {
    await endAllDevices(person)
    return { done: true as const }
  },
})
