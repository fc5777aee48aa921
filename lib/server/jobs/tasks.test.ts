import type { JobHelpers } from 'graphile-worker'
import { expect, it, vi } from 'vitest'
import { log } from '@/lib/server/log'
import { sendMail } from './send-mail'
import { tasks } from './tasks'

vi.mock('./send-mail', () => ({ sendMail: vi.fn() }))
vi.mock('./make-pack-pdf', () => ({ makePackPdf: vi.fn() }))

it('a failed job tells the queue nothing of the row that it choked on', async () => {
  const error = new Error('Failed query: insert into mail … params: ib@venue.example')
  vi.mocked(sendMail).mockRejectedValueOnce(error)
  const logged = vi.spyOn(log, 'error').mockImplementation(() => undefined)
  const thrown: unknown = await Promise.resolve(
    tasks['send-mail']?.({ mailId: 'a' }, { job: { id: '7', attempts: 2 } } as JobHelpers),
  ).catch((reason: unknown) => reason)
  expect(thrown).toBeInstanceOf(Error)
  expect(`${(thrown as Error).message}${(thrown as Error).stack}`).not.toContain('venue.example')
  expect((thrown as Error).cause).toBeUndefined()
  expect(logged).toHaveBeenCalledWith({ error, task: 'send-mail', jobId: '7', attempt: 2 }, 'a job failed')
})
