'use client'

import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import { loadPage } from '@/lib/client/load-page'
import { acceptInvitation } from '@/lib/client/sign-in'

export function JoinButton({ token, partyName }: { token: string; partyName: string }) {
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)

  const join = async () => {
    setBusy(true)
    setRefusal(null)
    try {
      await acceptInvitation({ token })
      loadPage('/tours')
    } catch (error) {
      setBusy(false)
      setRefusal(error instanceof Error ? error.message : String(error))
    }
  }

  return (
    <div className="flex flex-col items-start gap-4">
      {refusal && <Notice kind="error">{refusal}</Notice>}
      <Button kind="primary" busy={busy ? 'Joining' : null} onClick={join}>
        Join {partyName}
      </Button>
    </div>
  )
}
