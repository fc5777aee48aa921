import { createServer } from 'node:net'
import { Failure } from './failure.mjs'

const HOST = '127.0.0.1'
const LAST_PORT = 65_535
const TRIES = 50

/** Binds a port for a moment: the number it got, or null when it is taken or not ours to take. Port 0 asks for any. */
function tryPort(port) {
  return new Promise((resolve, reject) => {
    const server = createServer()
    server.once('error', (error) =>
      error.code === 'EADDRINUSE' || error.code === 'EACCES' ? resolve(null) : reject(error),
    )
    server.listen({ port, host: HOST, exclusive: true }, () => {
      const { port: bound } = server.address()
      server.close(() => resolve(bound))
    })
  })
}

export async function isPortFree(port) {
  return (await tryPort(port)) !== null
}

/** A free port on loopback: the one wanted, else any. */
export async function anyFreePort(wanted) {
  if (wanted && (await isPortFree(wanted))) return wanted
  return tryPort(0)
}

/** The first free port from `first` upwards. */
export async function nextFreePort(first) {
  for (let port = first; port <= Math.min(first + TRIES, LAST_PORT); port += 1) {
    if (await isPortFree(port)) return port
  }
  throw new Failure(`No port from ${first} to ${first + TRIES} is free on ${HOST}.`, {
    todo: 'Set PORT to a free one and start again.',
  })
}

/**
 * The app's port: what PORT says, and then nothing else; without PORT the first free one from the usual port on.
 * @returns {Promise<{ port: number, moved: boolean }>}
 */
export async function appPort({ asked, usual }) {
  if (asked === undefined || asked === '') {
    const port = await nextFreePort(usual)
    return { port, moved: port !== usual }
  }
  const port = Number(asked)
  if (!Number.isInteger(port) || port < 1 || port > LAST_PORT) {
    throw new Failure(`PORT is "${asked}", which is not a port.`, { todo: `Set PORT to a number from 1 to ${LAST_PORT}.` })
  }
  if (!(await isPortFree(port))) {
    throw new Failure(`Port ${port} on ${HOST} is taken by another program, or not allowed to you.`, {
      todo: 'Stop that program, set PORT to another number, or leave PORT unset to take the next free port.',
    })
  }
  return { port, moved: false }
}
