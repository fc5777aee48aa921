import type { Metadata, Viewport } from 'next'
import type { ReactNode } from 'react'
import { SkipLink } from '@/components/ui/skip-link'
import { themeScript } from '@/components/ui/theme-script'
import { tokens } from '@/components/ui/tokens'
import './globals.css'

export const metadata: Metadata = {
  title: { default: 'Hoopwright', template: '%s · Hoopwright' },
  description:
    'For drum and backline teams on tour: kit and notes, plot and patch, what each venue supplies, and every rented drum tuned to the same notes.',
  applicationName: 'Hoopwright',
  formatDetection: { telephone: false },
}

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: tokens.paper.paper },
    { media: '(prefers-color-scheme: dark)', color: tokens.stage.paper },
  ],
}

export default function RootLayout({ children }: { children: ReactNode }) {
  return (
    // The script below sets the theme on this element before React meets it.
    <html lang="en-GB" suppressHydrationWarning>
      <head>
        <script dangerouslySetInnerHTML={{ __html: themeScript }} />
      </head>
      <body className="min-h-dvh antialiased">
        <SkipLink />
        {children}
      </body>
    </html>
  )
}
