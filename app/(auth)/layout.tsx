import Link from 'next/link'
import type { ReactNode } from 'react'
import { Hoop } from '@/components/signature/hoop'
import { ThemeToggle } from '@/components/ui/theme-toggle'

/** The door: one form on paper, and beside it the drum it is all about. */
export default function AuthLayout({ children }: { children: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col">
      <header className="flex items-center justify-between gap-4 px-5 py-3 sm:px-8">
        <Link href="/" className="name text-2xl">
          Hoopwright
        </Link>
        <ThemeToggle />
      </header>
      <div className="mx-auto grid w-full max-w-6xl grow items-start gap-12 px-5 pt-6 pb-16 sm:px-8 lg:grid-cols-[26rem_minmax(0,1fr)] lg:pt-14">
        <main id="main" className="min-w-0">
          {children}
        </main>
        <div aria-hidden className="hidden justify-self-end lg:block">
          <Hoop role="tom" diameterIn={12} depthIn={8} lugs={6} name="Tom 12" note="D3" view="above" pxPerInch={36} className="max-w-full" />
        </div>
      </div>
    </div>
  )
}
