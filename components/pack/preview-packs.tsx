'use client'

import type { Route } from 'next'
import { useRouter } from 'next/navigation'
import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import { usePackPreview } from '@/lib/client/packs'

export interface PackReader {
  of: { showId: string } | { hireId: string }
  name: string
  detail: string
}

export interface PreviewPacksProps {
  tourId: string
  rigId: string
  revisionId: string
  readers: readonly PackReader[]
}

const idOf = (of: PackReader['of']) => ('showId' in of ? of.showId : of.hireId)

/** Everybody who gets something of a revision, each with the button that shows what. */
export function PreviewPacks({ tourId, rigId, revisionId, readers }: PreviewPacksProps) {
  const router = useRouter()
  const preview = usePackPreview()
  const open = async (of: PackReader['of']) => {
    const made = await preview
      .mutateAsync({ ...of, revisionId, ...('hireId' in of ? { rigId } : {}) })
      .catch(() => null)
    if (made) router.push(`/tours/${tourId}/revisions/packs/${made.id}` as Route)
  }
  return (
    <>
      {preview.error && (
        <Notice kind="error" word="Not made" className="mb-3">
          {preview.error.message}
        </Notice>
      )}
      <ul className="flex list-none flex-col">
        {readers.map(({ of, name, detail }) => (
          <li key={idOf(of)} className="flex flex-wrap items-center gap-x-4 gap-y-1 border-b border-line py-1">
            <span className="min-w-0 grow basis-60">
              <span className="font-bold">{name}</span> <span className="text-soft">{detail}</span>
            </span>
            <Button
              onClick={() => void open(of)}
              busy={
                preview.isPending &&
                preview.variables &&
                idOf(of) === (preview.variables.showId ?? preview.variables.hireId)
                  ? 'Composing'
                  : null
              }
            >
              Preview the pack for {name}
            </Button>
          </li>
        ))}
      </ul>
    </>
  )
}
