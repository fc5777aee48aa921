import { z } from 'zod'
import { idSchema, removeSchema } from '@/lib/contracts/common'
import { supplierSchema, updateSupplierSchema } from '@/lib/contracts/directory'
import { changeSupplier, removeSupplier } from '@/lib/server/directory/suppliers'
import { defineRoute } from '@/lib/server/http/define-route'

const params = z.object({ supplierId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateSupplierSchema,
  response: supplierSchema,
  handler: ({ actor, params, body }) => changeSupplier(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeSchema,
  response: supplierSchema,
  handler: ({ actor, params, body }) => removeSupplier(actor, { ...params, ...body }),
})
