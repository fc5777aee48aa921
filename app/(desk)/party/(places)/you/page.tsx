import type { Metadata } from 'next'
import { ThemeToggle } from '@/components/ui/theme-toggle'
import { pagePerson } from '@/lib/server/auth/page-actor'
import { hasPassword } from '@/lib/server/people/change-password'
import { listDevices } from '@/lib/server/people/devices'
import { Devices } from './devices'
import { PasswordForm } from './password-form'

export const metadata: Metadata = { title: 'Your devices and password' }

export default async function YouPage() {
  const person = await pagePerson()
  const [devices, known] = await Promise.all([listDevices(person), hasPassword(person)])
  return (
    <>
      <h1 className="text-4xl">{person.name}</h1>
      <p className="mt-1 text-soft">{person.email}</p>
      <Devices devices={devices} />
      <section aria-labelledby="password-title" className="mt-12">
        <h2 id="password-title" className="text-2xl">
          {known ? 'Change your password' : 'Choose a password'}
        </h2>
        <p className="mt-1 mb-4 text-soft">
          {known
            ? 'Saving a new one signs you out on every other device.'
            : 'You sign in by mailed links so far. With a password you can do without the mail.'}
        </p>
        <PasswordForm known={known} />
      </section>
      <section aria-labelledby="light-title" className="mt-12">
        <h2 id="light-title" className="text-2xl">
          Light on this device
        </h2>
        <p className="mt-1 mb-2 text-soft">Paper for daylight, near-black beside the stage. This device keeps it.</p>
        <div className="-ml-4">
          <ThemeToggle />
        </div>
      </section>
    </>
  )
}
