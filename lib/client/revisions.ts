'use client'

import { useMutation } from '@tanstack/react-query'
import { callApi } from '@/lib/client/http'
import { revisionSummarySchema } from '@/lib/contracts/revision'
import type { IssueRevision } from '@/lib/contracts/revision'

/** Issues the next revision of a rig. The id makes a request that is sent again the same request. */
export function useIssueRevision(rigId: string) {
  return useMutation({
    mutationFn: (body: IssueRevision) =>
      callApi(`/api/rigs/${rigId}/revisions`, { method: 'POST', body, response: revisionSummarySchema }),
  })
}
