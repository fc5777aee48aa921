'use client'

import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import type { Removal } from './use-removal'
import { useRemoval } from './use-removal'

export interface RemoveButtonProps extends Removal {
  action: string
  busy: string
}

/** Takes something away at once. A refusal stands beside the button with its reason. */
export function RemoveButton({ action, busy, ...removal }: RemoveButtonProps) {
  const { working, refusal, take } = useRemoval()
  return (
    <>
      <Button kind="quiet" busy={working ? busy : null} onClick={() => take(removal)}>
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
