'use client'

import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { showToast } from '@/components/ui/toast'

export interface Removal {
  /** What the toast says when it is done ("The show is off the run"). */
  done: string
  remove: () => Promise<unknown>
  /** The way back: its words and what it does. */
  undo: { label: string; run: () => Promise<unknown> }
  onRemoved?: () => void
}

const words = (error: unknown) => (error instanceof Error ? error.message : 'Something failed. Nothing was changed.')

/** Takes something away at once; the toast offers the way back. A refusal is kept with its reason. */
export function useRemoval() {
  const router = useRouter()
  const [working, setWorking] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)
  const bringBack = async (run: () => Promise<unknown>) => {
    try {
      await run()
      router.refresh()
    } catch (error) {
      showToast(words(error))
    }
  }
  const take = async ({ done, remove, undo, onRemoved }: Removal) => {
    setWorking(true)
    setRefusal(null)
    try {
      await remove()
      showToast(done, { label: undo.label, run: () => void bringBack(undo.run) })
      onRemoved?.()
      router.refresh()
    } catch (error) {
      setRefusal(words(error))
    } finally {
      setWorking(false)
    }
  }
  return { working, refusal, take: (removal: Removal) => void take(removal) }
}
