'use client'

import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import type { GaugeInput, GaugePairInput, GaugeWithPairs, Gauges } from '@/lib/contracts/gauge'
import { gaugePairSchema, gaugeSchema, gaugesSchema, gaugeWithPairsSchema } from '@/lib/contracts/gauge'
import { callApi } from './http'

/** Keys begin with the live topic of the party's gauges, so that a change anywhere reads them again. */
const gaugesKey = (partyId: string) => ['gauge', partyId] as const

export function useGauges(partyId: string, initialData: Gauges) {
  return useQuery({
    queryKey: [...gaugesKey(partyId), 'all'],
    queryFn: ({ signal }) => callApi('/api/gauges', { response: gaugesSchema, signal }),
    initialData,
  })
}

/** One gauge with all its pairs. */
export function useGauge(partyId: string, initialData: GaugeWithPairs) {
  const { id } = initialData.gauge
  return useQuery({
    queryKey: [...gaugesKey(partyId), id],
    queryFn: ({ signal }) => callApi(`/api/gauges/${id}`, { response: gaugeWithPairsSchema, signal }),
    initialData,
  })
}

/** The gauges' rows over HTTP; `useReadGaugesAgain` after each makes the pages show what stands. */
export const gauges = {
  create: (id: string, gauge: GaugeInput) =>
    callApi('/api/gauges', { method: 'POST', body: { id, gauge }, response: gaugeSchema }),
  change: (id: string, version: number, gauge: GaugeInput) =>
    callApi(`/api/gauges/${id}`, { method: 'PATCH', body: { version, gauge }, response: gaugeSchema }),
  remove: (id: string, version: number) =>
    callApi(`/api/gauges/${id}`, { method: 'DELETE', body: { version }, response: gaugeSchema }),
  restore: (id: string, version: number) =>
    callApi(`/api/gauges/${id}/restore`, { method: 'POST', body: { version }, response: gaugeSchema }),
  addPair: (gaugeId: string, id: string, pair: GaugePairInput) =>
    callApi(`/api/gauges/${gaugeId}/pairs`, { method: 'POST', body: { id, pair }, response: gaugePairSchema }),
}

export function useReadGaugesAgain(partyId: string) {
  const client = useQueryClient()
  return () => client.invalidateQueries({ queryKey: gaugesKey(partyId) })
}

/** A change of the party's gauges; refused or not, what is shown is read again. */
function useGaugeChange<Input, Answer>(partyId: string, change: (input: Input) => Promise<Answer>) {
  const again = useReadGaugesAgain(partyId)
  return useMutation({ mutationFn: change, onSettled: again })
}

export function useChooseToursGauge(partyId: string) {
  return useGaugeChange(partyId, (gaugeId: string | null) =>
    callApi('/api/gauges/tours-gauge', { method: 'PUT', body: { gaugeId }, response: gaugesSchema }),
  )
}

/** Puts a gauge back that was taken away. */
export function useRestoreGauge(partyId: string) {
  return useGaugeChange(partyId, ({ gaugeId, version }: { gaugeId: string; version: number }) =>
    gauges.restore(gaugeId, version),
  )
}

/** Strikes a pair, or lets it count again. */
export function useStrikeGaugePair(partyId: string) {
  return useGaugeChange(partyId, ({ pairId, struck }: { pairId: string; struck: boolean }) =>
    callApi(`/api/gauge-pairs/${pairId}/${struck ? 'strike' : 'restore'}`, {
      method: 'POST',
      response: gaugePairSchema,
    }),
  )
}
