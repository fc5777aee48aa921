'use client'

import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import { showToast } from '@/components/ui/toast'

export interface RemoveButtonProps {
  action: string
  busy: string
  /** What the toast says when it is done ("The show is off the run"). */
  done: string
  remove: () => Promise<unknown>
  /** The way back, where there is one: its words and what it does. */
  undo: { label: string; run: () => Promise<unknown> } | null
  onRemoved?: () => void
}

const words = (error: unknown) => (error instanceof Error ? error.message : 'Something failed. Nothing was changed.')

/** Takes something away at once; the toast offers the way back. A refusal stands beside the button with its reason. */
export function RemoveButton({ action, busy, done, remove, undo, onRemoved }: RemoveButtonProps) {
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
  const take = async () => {
    setWorking(true)
    setRefusal(null)
    try {
      await remove()
      showToast(done, undo && { label: undo.label, run: () => void bringBack(undo.run) })
      onRemoved?.()
      router.refresh()
    } catch (error) {
      setRefusal(words(error))
    } finally {
      setWorking(false)
    }
  }
  return (
    <>
      <Button kind="quiet" busy={working ? busy : null} onClick={() => void take()}>
        {action}
      </Button>
      {refusal && (
        <Notice kind="error" className="basis-full">
          {refusal}
        </Notice>
      )}
    </>
  )
}
