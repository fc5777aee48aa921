'use client'

import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { Select } from '@/components/ui/select'
import { useCopyKit } from '@/lib/client/kit'
import { WaitingForConnection } from './waiting-for-connection'

export type KitSource = { rigId: string; rigName: string; tourName: string; entries: number }

const sourceWords = ({ rigName, tourName, entries }: KitSource) =>
  `${rigName}, ${tourName}: ${entries} ${entries === 1 ? 'entry' : 'entries'}`

/** Copies the kit of another rig of the party behind this one's. */
export function CopyKit({ rigId, sources }: { rigId: string; sources: readonly KitSource[] }) {
  // One id a copy: sent again after a lost answer, it copies nothing twice.
  const [copyId, setCopyId] = useState<string | null>(null)
  const [fromRigId, setFromRigId] = useState(sources[0]?.rigId ?? '')
  const copy = useCopyKit(rigId)
  const source = sources.find((each) => each.rigId === fromRigId)
  if (sources.length === 0) return null
  return (
    <>
      <Button onClick={() => setCopyId(crypto.randomUUID())}>Copy a kit from another rig</Button>
      <Dialog
        open={copyId !== null}
        onOpenChange={(open) => !open && setCopyId(null)}
        title="Copy a kit from another rig"
        description="Its drums, cymbals, hardware and microphones are added behind what this kit holds. Later changes of either stay its own."
        closeLabel="Leave the kit as it is"
        actions={
          <Button
            kind="primary"
            busy={copy.isPending && 'Copying'}
            onClick={() => {
              if (copyId) copy.mutate({ copyId, fromRigId }, { onSuccess: () => setCopyId(null) })
            }}
          >
            {source ? `Copy ${source.entries} from ${source.rigName}` : 'Copy'}
          </Button>
        }
      >
        <Field label="Copy from">
          {(control) => (
            <Select
              {...control}
              value={fromRigId}
              onChange={(event) => setFromRigId(event.target.value)}
              options={sources.map((each) => ({ value: each.rigId, label: sourceWords(each) }))}
            />
          )}
        </Field>
        <WaitingForConnection busy={copy.isPending} tries={copy.failureCount} what="Your choice" />
        {copy.isError && <Notice kind="error">{copy.error.message}</Notice>}
      </Dialog>
    </>
  )
}
