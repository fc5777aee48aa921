'use client'

import { useMutation } from '@tanstack/react-query'
import { callApi } from '@/lib/client/http'
import { packStateSchema } from '@/lib/contracts/pack'
import type { MakePack } from '@/lib/contracts/pack'

/** Makes a pack to look at. */
export function usePackPreview() {
  return useMutation({
    mutationFn: (body: MakePack) => callApi('/api/packs', { method: 'POST', body, response: packStateSchema }),
  })
}
