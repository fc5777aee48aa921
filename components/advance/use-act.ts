'use client'

import { useMutation } from '@tanstack/react-query'
import { useRouter } from 'next/navigation'

/** Does one thing on the server and reads the page again; what went wrong is kept for the page to say. */
export function useAct<Input, Answer>(act: (input: Input) => Promise<Answer>) {
  const router = useRouter()
  const mutation = useMutation({
    mutationFn: act,
    // After a refusal too: it often means that the page is behind.
    onSettled: () => router.refresh(),
  })
  return { run: mutation.mutate, busy: mutation.isPending, trouble: mutation.error?.message ?? null, answer: mutation.data ?? null, forget: mutation.reset }
}
