'use client'

import type { Send } from '@/lib/contracts/dispatch'
import { sendOutcomesSchema, stoppedSchema } from '@/lib/contracts/dispatch'
import { printedLinkSchema, withdrawnSchema } from '@/lib/contracts/grant'
import { callApi } from './http'

export const sendPacks = (body: Send) => callApi('/api/dispatches', { method: 'POST', body, response: sendOutcomesSchema })

export const stopDispatch = (dispatchId: string) =>
  callApi(`/api/dispatches/${dispatchId}/stop`, { method: 'POST', response: stoppedSchema })

export const withdrawLink = (grantId: string) =>
  callApi(`/api/grants/${grantId}/withdraw`, { method: 'POST', response: withdrawnSchema })

export const printLink = (grantId: string) =>
  callApi(`/api/grants/${grantId}/tokens`, { method: 'POST', response: printedLinkSchema })
