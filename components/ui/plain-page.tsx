import type { ReactNode } from 'react'

export interface PlainPageProps {
  /** What happened, as a heading. */
  title: string
  /** What is kept, and what to do. */
  children: ReactNode
  actions?: ReactNode
}

/** A page with one thing to say. */
export function PlainPage({ title, children, actions }: PlainPageProps) {
  return (
    <main id="main" className="mx-auto flex min-h-dvh max-w-2xl flex-col justify-center px-6 py-16">
      <p className="name text-xl">Hoopwright</p>
      <div className="mt-6 border-l-4 border-spike pl-5">
        <h1 className="text-4xl">{title}</h1>
        <div className="mt-3 space-y-2 text-lg text-soft">{children}</div>
        {actions && <div className="mt-6 flex flex-wrap gap-3">{actions}</div>}
      </div>
    </main>
  )
}
