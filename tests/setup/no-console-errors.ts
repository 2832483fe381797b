import { afterEach, beforeEach, vi } from 'vitest'

// An error on the console is a defect that nobody looked at: it fails the test.
beforeEach(() => {
  vi.spyOn(console, 'error').mockImplementation((...parts: unknown[]) => {
    throw new Error(`console.error: ${parts.map(String).join(' ')}`)
  })
})
afterEach(() => {
  vi.restoreAllMocks()
})
