import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { holdSheet } from '../../../app/budgets/[id]/client/state/sheetStore'
import type { SheetSession } from '../../../lib/sheet/session'

const opening = { budget: 'tamarack', person: 'maren' }
let destroyed = 0
const session = { destroy: async () => void destroyed++ } as unknown as SheetSession
const open = vi.fn(async () => session)

beforeEach(() => {
  vi.useFakeTimers()
  destroyed = 0
  open.mockClear()
})
afterEach(async () => {
  await vi.runAllTimersAsync()
  vi.useRealTimers()
})

describe('the session outside React', () => {
  it('is opened once for a component that mounts twice, and lives on between', async () => {
    const first = holdSheet(opening, open)
    first.release()
    await vi.advanceTimersByTimeAsync(1_000)
    const second = holdSheet(opening, open)
    await vi.advanceTimersByTimeAsync(60_000)
    expect(open).toHaveBeenCalledTimes(1)
    expect(destroyed).toBe(0)
    second.release()
  })
  it('is destroyed once nobody has held it for a while, and opened anew after that', async () => {
    const only = holdSheet(opening, open)
    only.release()
    only.release()
    await vi.advanceTimersByTimeAsync(10_000)
    expect(destroyed).toBe(1)
    holdSheet(opening, open).release()
    expect(open).toHaveBeenCalledTimes(2)
  })
  it('stays for the other holder', async () => {
    const one = holdSheet(opening, open)
    const other = holdSheet(opening, open)
    one.release()
    one.release()
    await vi.advanceTimersByTimeAsync(60_000)
    expect(destroyed).toBe(0)
    other.release()
  })
})
