import { createSupplierSchema, supplierSchema } from '@/lib/contracts/directory'
import { createSupplier } from '@/lib/server/directory/suppliers'
import { defineRoute } from '@/lib/server/http/define-route'

export const POST = defineRoute({
  body: createSupplierSchema,
  response: supplierSchema,
  status: 201,
  handler: ({ actor, body }) => createSupplier(actor, body),
})
