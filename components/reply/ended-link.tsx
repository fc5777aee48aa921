'use client'

import { useState } from 'react'
import { plainCall } from '@/lib/client/plain-call'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { PlainPage } from '../ui/plain-page'

/** What stands behind a link that has ended: withdrawn says so, run out offers a fresh one to the known address. */
export function EndedLink({ reason, token }: { reason: 'withdrawn' | 'expired'; token: string }) {
  const [state, setState] = useState<{ kind: 'asked' | 'sending' | 'sent' } | { kind: 'failed'; message: string }>({ kind: 'asked' })
  if (reason === 'withdrawn') {
    return (
      <PlainPage title="This link was withdrawn">
        <p>What you answered is kept. If you still need it, ask whoever sent it for a new link.</p>
      </PlainPage>
    )
  }
  async function send() {
    setState({ kind: 'sending' })
    try {
      await plainCall('/api/grants/fresh-link', { token })
      setState({ kind: 'sent' })
    } catch (error) {
      setState({ kind: 'failed', message: error instanceof Error ? error.message : 'That did not work. Please try again.' })
    }
  }
  return (
    <div className="thumb">
      <PlainPage
        title="This link has run out"
        actions={
          state.kind === 'sent' ? undefined : (
            <Button kind="primary" busy={state.kind === 'sending' && 'Mailing a fresh link'} onClick={() => void send()}>
              Mail a fresh link to the address we know
            </Button>
          )
        }
      >
        <p>What you answered is kept. We can mail a fresh link, but only to the address that the first one went to.</p>
        {state.kind === 'sent' && (
          <Notice kind="success">A fresh link is on its way to the address we know.</Notice>
        )}
        {state.kind === 'failed' && <Notice kind="error">{state.message}</Notice>}
      </PlainPage>
    </div>
  )
}
