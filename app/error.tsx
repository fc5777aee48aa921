'use client'

import { Button } from '@/components/ui/button'
import { ButtonLink } from '@/components/ui/button-link'
import { PlainPage } from '@/components/ui/plain-page'

export default function ErrorPage({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <PlainPage
      title="This page could not be shown"
      actions={
        <>
          <Button kind="primary" onClick={reset}>
            Show the page again
          </Button>
          <ButtonLink href="/">Go to the first page</ButtonLink>
        </>
      }
    >
      <p>Whatever was marked as saved is kept. What you were typing just now may need typing again.</p>
      {error.digest && (
        <p>
          If it happens again, tell the person who runs Hoopwright for you this number:{' '}
          <span className="figures text-ink">{error.digest}</span>
        </p>
      )}
    </PlainPage>
  )
}
