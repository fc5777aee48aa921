'use client'

import type { AdvanceView } from '@/lib/contracts/advance'
import type { Settle, TakeDown } from '@/lib/contracts/answer'
import { savedSchema } from '@/lib/contracts/answer'
import { callApi } from './http'

const base = (of: AdvanceView['of']) => (of.kind === 'show' ? `/api/shows/${of.showId}` : `/api/hires/${of.hireId}`)

export const takeDownAnswer = (of: AdvanceView['of'], body: TakeDown) =>
  callApi(`${base(of)}/answers`, { method: 'POST', body, response: savedSchema })

export const settleAnswers = (of: AdvanceView['of'], body: Settle) =>
  callApi(`${base(of)}/settlements`, { method: 'POST', body, response: savedSchema })
