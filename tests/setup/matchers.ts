import { afterEach, beforeEach, expect, vi } from 'vitest'

interface Within {
  relative?: number
  absolute?: number
}

declare module 'vitest' {
  interface Assertion<T> {
    /** passes when |got − wanted| ≤ max(relative × |wanted|, absolute) */
    toBeWithin(wanted: number, within: Within): T
  }
}

expect.extend({
  toBeWithin(got: unknown, wanted: number, { relative = 0, absolute = 0 }: Within) {
    const allowed = Math.max(relative * Math.abs(wanted), absolute)
    const off = typeof got === 'number' ? Math.abs(got - wanted) : Number.NaN
    return {
      pass: off <= allowed,
      message: () => `got ${String(got)}, wanted ${wanted}: off by ${off}, allowed ${allowed}`,
    }
  },
})

beforeEach(() => {
  vi.spyOn(console, 'error')
  vi.spyOn(console, 'warn')
})
afterEach(() => {
  expect(console.error).not.toHaveBeenCalled()
  expect(console.warn).not.toHaveBeenCalled()
  vi.restoreAllMocks()
})
