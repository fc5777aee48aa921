import { useMutation } from '@tanstack/react-query'
import { printedLinkSchema, withdrawnSchema } from '@/lib/contracts/grant'
import { callApi } from './http'

/** Prints another key to a show's bench; the answer is the only time it is seen. */
export function usePrintBenchLink(showId: string) {
  return useMutation({
    mutationFn: () => callApi(`/api/shows/${showId}/bench-links`, { method: 'POST', response: printedLinkSchema }),
  })
}

/** Ends a bench link with every print of it. */
export function useWithdrawBenchLink(showId: string) {
  return useMutation({
    mutationFn: (grantId: string) =>
      callApi(`/api/shows/${showId}/bench-links/${grantId}`, { method: 'DELETE', response: withdrawnSchema }),
  })
}
