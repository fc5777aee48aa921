'use client'

import type { ReactNode } from 'react'
import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { EmptyState } from '@/components/ui/empty-state'
import { Notice } from '@/components/ui/notice'
import { useAddSet } from '@/lib/client/kit'
import { fivePieceKit } from '@/lib/contracts/kit-defaults'
import { WaitingForConnection } from './waiting-for-connection'

/** What to do first in a kit that holds nothing. */
export function EmptyKit({ rigId, mayEdit, others }: { rigId: string; mayEdit: boolean; others: ReactNode }) {
  const add = useAddSet(rigId)
  // Made once, so that pressing twice is the same request.
  const [five] = useState(() => fivePieceKit().map((entry) => ({ id: crypto.randomUUID(), entry })))
  if (!mayEdit)
    return (
      <EmptyState title="Nothing in this kit yet">
        A drum tech adds the drums first. What is added shows here at once.
      </EmptyState>
    )
  return (
    <EmptyState
      title="Nothing in this kit yet"
      action={
        <>
          <Button kind="primary" busy={add.isPending && 'Adding five drums'} onClick={() => add.mutate(five)}>
            Add a five-piece kit
          </Button>
          {others}
        </>
      }
    >
      <p>
        Start with the drums: a kick 22, a snare 14, toms 10 and 12 and a floor tom 16 in one step, each then changed as
        you have it. The plot, the lines that venues answer and the tuning sheets all come from here.
      </p>
      <WaitingForConnection busy={add.isPending} tries={add.failureCount} what="The five drums" />
      {add.isError && <Notice kind="error">{add.error.message}</Notice>}
    </EmptyState>
  )
}
