'use client'

import { Button } from '@/components/ui/button'
import { PlainPage } from '@/components/ui/plain-page'
import './globals.css'

/** Stands in for the whole document when the root layout itself fails, so it carries its own `html` and `body`. */
export default function GlobalError({ reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <html lang="en-GB">
      <body>
        <PlainPage
          title="Hoopwright could not start this page"
          actions={
            <Button kind="primary" onClick={reset}>
              Start it again
            </Button>
          }
        >
          <p>Whatever was marked as saved is kept. Wait a minute, then start the page again.</p>
        </PlainPage>
      </body>
    </html>
  )
}
