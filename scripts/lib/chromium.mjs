import { existsSync } from 'node:fs'
import { delimiter, join } from 'node:path'
import { installFromDebian } from './apt.mjs'
import { Failure } from './failure.mjs'

const NAMES = ['chromium', 'chromium-browser', 'google-chrome-stable', 'google-chrome']

/** The Chromium of this machine: what CHROMIUM_PATH says, else the first one on the path. */
export function chromiumPath(env = process.env) {
  if (env['CHROMIUM_PATH']) return env['CHROMIUM_PATH']
  for (const folder of ['/usr/bin', ...(env['PATH'] ?? '').split(delimiter)]) {
    const found = NAMES.map((name) => join(folder, name)).find((file) => existsSync(file))
    if (found) return found
  }
  return null
}

/** Finds Chromium for the browser tests, or installs Debian's. */
export async function findChromium({ place, processes, say }) {
  const found = chromiumPath(processes.env)
  if (found) {
    if (!existsSync(found)) {
      throw new Failure(`CHROMIUM_PATH names ${found}, which is not there.`, { todo: 'Set it to a Chromium, or unset it.' })
    }
    say(found)
    return found
  }
  await installFromDebian(
    {
      packages: ['chromium'],
      what: 'Chromium, which the browser tests drive,',
      otherwise: 'Or set CHROMIUM_PATH to a Chromium that is here.',
    },
    { place, processes },
  )
  const installed = chromiumPath(processes.env)
  if (!installed) throw new Failure('Chromium was installed, but is not where it is expected.', { todo: 'Set CHROMIUM_PATH to it.' })
  say(`${installed}, installed from Debian`)
  return installed
}
