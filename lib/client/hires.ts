import type { HireInput } from '@/lib/contracts/hire'
import { hireSchema } from '@/lib/contracts/hire'
import { callApi } from './http'

export const createHire = (tourId: string, id: string, hire: HireInput) =>
  callApi(`/api/tours/${tourId}/hires`, { method: 'POST', body: { id, hire }, response: hireSchema })
export const changeHire = (id: string, version: number, hire: HireInput) =>
  callApi(`/api/hires/${id}`, { method: 'PATCH', body: { version, hire }, response: hireSchema })
export const removeHire = (id: string, version: number) =>
  callApi(`/api/hires/${id}`, { method: 'DELETE', body: { version }, response: hireSchema })
