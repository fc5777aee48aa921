'use client'

import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { LocalTime } from '@/components/desk/local-time'
import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import { signOutDevice, signOutEverywhere } from '@/lib/client/account'
import { loadPage } from '@/lib/client/load-page'
import { signOutHere } from '@/lib/client/sign-in'
import type { Device } from '@/lib/contracts/sign-in'

export function Devices({ devices }: { devices: readonly Device[] }) {
  const router = useRouter()
  const [busy, setBusy] = useState<string | null>(null)
  const [refusal, setRefusal] = useState<string | null>(null)

  const during = async (what: string, work: () => Promise<void>) => {
    setBusy(what)
    setRefusal(null)
    try {
      await work()
    } catch (error) {
      setRefusal(error instanceof Error ? error.message : String(error))
    } finally {
      setBusy(null)
    }
  }

  const out = (device: Device) =>
    during(device.id, async () => {
      if (device.current) return signOutHere()
      await signOutDevice(device.id)
      router.refresh()
    })

  const outEverywhere = () =>
    during('everywhere', async () => {
      await signOutEverywhere()
      loadPage('/sign-in?said=everywhere')
    })

  return (
    <section aria-labelledby="devices-title" className="mt-8">
      <div className="flex flex-wrap items-end justify-between gap-3">
        <h2 id="devices-title" className="text-2xl">
          Where you are signed in
        </h2>
        <Button busy={busy === 'everywhere' ? 'Signing out' : null} onClick={outEverywhere}>
          Sign out everywhere
        </Button>
      </div>
      {refusal && (
        <Notice kind="error" className="mt-3">
          {refusal}
        </Notice>
      )}
      <ul className="mt-3 border-t-2 border-ink">
        {devices.map((device) => (
          <li key={device.id} className="flex flex-wrap items-center gap-x-6 gap-y-1 border-b border-line py-2">
            <div className="min-w-0 grow basis-64">
              <p className="font-bold">
                {device.words}
                {device.current && <span className="ml-2 font-normal text-reed">this device</span>}
              </p>
              <p className="text-sm text-soft">
                Last used <LocalTime iso={device.lastSeen} />
              </p>
            </div>
            <Button kind="quiet" busy={busy === device.id ? 'Signing out' : null} onClick={() => out(device)}>
              Sign out<span className="sr-only"> on {device.words}</span>
            </Button>
          </li>
        ))}
      </ul>
    </section>
  )
}
