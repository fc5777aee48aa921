import { expect, it } from 'vitest'
import { createSteps } from './steps.mjs'

function recorded() {
  let text = ''
  let clock = 0
  const steps = createSteps({ write: (more) => (text += more), now: () => clock })
  return { steps, text: () => text, pass: (ms) => (clock += ms) }
}

it('says of each step what came of it, how long it took and when that was', async () => {
  const { steps, text, pass } = recorded()
  await steps.step('Packages', () => pass(2000))
  const value = await steps.step('Tables', (say) => {
    pass(1500)
    say('up to date')
    return 7
  })
  expect(value).toBe(7)
  expect(text()).toBe('   2.0 s  Packages: done (2.0 s)\n   3.5 s  Tables: up to date (1.5 s)\n')
})

it('says which step failed and passes the failure on', async () => {
  const { steps, text, pass } = recorded()
  const failing = steps.step('Build', () => {
    pass(100)
    throw new Error('no')
  })
  await expect(failing).rejects.toThrow('no')
  expect(text()).toBe('   0.1 s  Build: failed (0.1 s)\n')
})
