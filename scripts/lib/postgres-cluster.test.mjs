import { chmodSync, chownSync, mkdirSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { once } from 'node:events'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import pg from 'pg'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { backUp, listBackups, restore } from './database-archive.mjs'
import { isAlive } from './process-identity.mjs'
import { openCluster, runningServer } from './postgres-cluster.mjs'
import { clusterHome } from './postgres-home.mjs'
import { foundPrograms } from './postgres-programs.mjs'
import { Processes } from './processes.mjs'

const SLOW = 60_000
const PASSWORD = 'a-password'

let folder
let place
let home
let open = []

function makePlace(root) {
  const made = { kind: 'test', root, shared: root, local: root, logs: join(root, 'logs'), processesFile: join(root, 'processes.json') }
  mkdirSync(made.logs, { recursive: true })
  return made
}

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'hw-pg-'))
  // As a project's folder is: to be passed through by PostgreSQL's user.
  mkdirSync(join(folder, 'project'), { mode: 0o755 })
  chmodSync(folder, 0o755)
  place = makePlace(join(folder, 'project'))
  home = clusterHome(place)
})

afterEach(async () => {
  await Promise.all(open.map((processes) => processes.stopAll()))
  open = []
  rmSync(folder, { recursive: true, force: true })
})

async function openHere(password = PASSWORD, throwaway = true) {
  const processes = new Processes({ place })
  open.push(processes)
  const told = []
  const cluster = await openCluster({ home, programs: foundPrograms()[0], processes, password, throwaway, say: (text) => told.push(text), tell: (text) => told.push(text) })
  return { ...cluster, processes, told: told.join('\n') }
}

async function query(url, sql) {
  const client = new pg.Client({ connectionString: url })
  await client.connect()
  try {
    return (await client.query(sql)).rows
  } finally {
    await client.end()
  }
}

describe('a cluster of its own', () => {
  it('runs behind its password on loopback, not as root, and stops without a trace', { timeout: SLOW }, async () => {
    const { url, port, processes, service } = await openHere()
    expect(await query(url, 'select current_user as name, inet_server_addr()::text as address')).toEqual([{ name: 'hoopwright', address: '127.0.0.1/32' }])
    await expect(query(url.replace(PASSWORD, 'wrong'), 'select 1')).rejects.toThrow('password authentication failed')
    expect(statSync(`/proc/${service.pid}`).uid).not.toBe(0)
    await processes.stopAll()
    expect(runningServer(home)).toBeNull()
    await expect(query(url, 'select 1')).rejects.toThrow(`connect ECONNREFUSED 127.0.0.1:${port}`)
  })

  it('keeps its data and its port from one start to the next, and takes a new password', { timeout: SLOW }, async () => {
    const first = await openHere()
    await query(first.url, 'create table drum as select 12 as inches')
    await first.processes.stopAll()
    const second = await openHere('another-password')
    expect(second.port).toBe(first.port)
    expect(await query(second.url, 'select inches from drum')).toEqual([{ inches: 12 }])
  })

  it('recovers from a server that was killed, says so and keeps the data', { timeout: SLOW }, async () => {
    const first = await openHere(PASSWORD, false)
    await query(first.url, 'create table drum as select 12 as inches')
    process.kill(first.service.pid, 'SIGKILL')
    await first.service.ended
    // Its own children end once they notice; until then the data is theirs.
    await first.processes.stopAll()
    const second = await openHere()
    expect(second.told).toContain(`an earlier server (process ${first.service.pid}) died without cleaning up`)
    expect(await query(second.url, 'select inches from drum')).toEqual([{ inches: 12 }])
  })

  it('is not fooled by a pid file whose number now belongs to another program', { timeout: SLOW }, async () => {
    const first = await openHere()
    await first.processes.stopAll()
    const file = join(home.data, 'postmaster.pid')
    writeFileSync(file, `${process.pid}\n${home.data}\n0\n${first.port}\n`)
    if (home.user.uid !== undefined) chownSync(file, home.user.uid, home.user.gid)
    expect(runningServer(home)).toBeNull()
    const second = await openHere()
    expect(second.told).toContain(`an earlier server (process ${process.pid}) died`)
    expect(isAlive({ pid: process.pid })).toBe(true)
  })

  it('stops a server that an earlier run left running, and starts its own', { timeout: SLOW }, async () => {
    const first = await openHere()
    const second = await openHere()
    expect(second.told).toContain(`(process ${first.service.pid}) was still running and has been stopped`)
    expect(await first.service.ended).toBe('ended with exit code 0')
  })

  it('takes another port when its own is taken', { timeout: SLOW }, async () => {
    const first = await openHere()
    await first.processes.stopAll()
    const squatter = createServer().listen(first.port, '127.0.0.1')
    await once(squatter, 'listening')
    const second = await openHere()
    expect(second.port).not.toBe(first.port)
    squatter.close()
  })

  it('makes a cluster anew whose making broke off', { timeout: SLOW }, async () => {
    mkdirSync(join(home.data, 'base'), { recursive: true })
    const { url, told } = await openHere()
    expect(told).toContain('new cluster')
    expect(await query(url, 'select 1 as one')).toEqual([{ one: 1 }])
  })
})

describe('the cluster’s folder', () => {
  it('lies in the project, closed to others', () => {
    expect(home).toMatchObject({ folder: join(place.local, 'pg'), elsewhere: false })
    expect(statSync(home.folder).mode & 0o777).toBe(0o700)
  })

  it('lies elsewhere when the path is too long for a socket, the same each time', () => {
    const far = makePlace(join(folder, 'a-very-long-name-for-a-folder'.repeat(3)))
    const away = clusterHome(far)
    expect(away.elsewhere).toBe(true)
    expect(away.folder).toMatch(/^\/var\/tmp\/hoopwright-[0-9a-f]{12}-test$/)
    expect(clusterHome(far).folder).toBe(away.folder)
    rmSync(away.folder, { recursive: true })
  })
})

describe('backup', () => {
  it('puts back the database and the files as they were', { timeout: SLOW }, async () => {
    const { url, processes, programs } = await openHere()
    const blobDir = join(folder, 'blobs')
    mkdirSync(blobDir)
    writeFileSync(join(blobDir, 'pack.pdf'), 'first')
    await query(url, 'create schema graphile_worker; create table drum as select 12 as inches')
    const { name } = await backUp({ place, processes, programs, url, blobDir })
    expect(listBackups(place)).toEqual([name])

    await query(url, 'update drum set inches = 13; create table later (id int)')
    writeFileSync(join(blobDir, 'pack.pdf'), 'second')
    await restore({ place, processes, programs, url, blobDir, name })

    expect(await query(url, 'select inches from drum')).toEqual([{ inches: 12 }])
    expect(await query(url, "select to_regclass('later') as later")).toEqual([{ later: null }])
    expect(readFileSync(join(blobDir, 'pack.pdf'), 'utf8')).toBe('first')
    await expect(restore({ place, processes, programs, url, blobDir, name: 'other' })).rejects.toThrow('There is no backup called other.')
  })
})
