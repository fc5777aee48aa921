import type { Metadata } from 'next'
import { Notice } from '@/components/ui/notice'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readParty } from '@/lib/server/party/party-settings'
import { SettingsForm } from './settings-form'

export const metadata: Metadata = { title: 'Party settings' }

export default async function SettingsPage() {
  const actor = await pageActor()
  const party = await pageAnswer(readParty(actor))
  const manages = rolesMay(actor.roles, 'party:manage')
  return (
    <>
      <h1 className="mb-5 text-4xl">Settings</h1>
      {!manages && (
        <Notice className="mb-5">An owner sets these. They hold for everybody in the party.</Notice>
      )}
      <SettingsForm party={party} readOnly={!manages} />
    </>
  )
}
