import { beforeEach, expect, it } from 'vitest'
import { dismissToast, showToast, toastStore } from './toast'

beforeEach(() => {
  for (const toast of toastStore.read()) dismissToast(toast.id)
})

it('keeps the three latest messages, oldest first', () => {
  for (const message of ['one', 'two', 'three', 'four']) showToast(message)
  expect(toastStore.read().map((toast) => toast.message)).toEqual(['two', 'three', 'four'])
})

it('tells its listeners of each change until they leave', () => {
  let heard = 0
  const leave = toastStore.subscribe(() => (heard += 1))
  const id = showToast('Tom 12 taken off the plot')
  dismissToast(id)
  expect(heard).toBe(2)
  leave()
  showToast('Crash 18 taken off the plot')
  expect(heard).toBe(2)
})
