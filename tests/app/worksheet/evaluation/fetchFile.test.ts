import { afterEach, expect, test, vi } from 'vitest'
import { fetchFile } from '../../../../app/budgets/[id]/client/evaluation/fetchFile'

const CABLE = { sha256: 'aa', name: 'cable.s2p' }
const answering = (answer: () => Promise<Response>) => {
  const asked = vi.fn((_address: string, _options: RequestInit) => answer())
  vi.stubGlobal('fetch', asked)
  return asked
}
afterEach(() => void vi.unstubAllGlobals())

test('the bytes come from the budget’s own evidence, with the person’s cookie', async () => {
  const asked = answering(async () => new Response(Uint8Array.of(1, 2, 3)))
  expect(await fetchFile('tamarack/..', CABLE)).toEqual(Uint8Array.of(1, 2, 3))
  expect(asked).toHaveBeenCalledWith('/api/v1/budgets/tamarack%2F../evidence/aa', { credentials: 'same-origin' })
})

test('a file that is not there is null; anything else says which file and why', async () => {
  answering(async () => new Response(null, { status: 404 }))
  expect(await fetchFile('tamarack', CABLE)).toBeNull()
  answering(async () => new Response(null, { status: 401 }))
  await expect(fetchFile('tamarack', CABLE)).rejects.toThrow(/'cable.s2p' could not be fetched.*status 401/)
  answering(async () => Promise.reject(new TypeError('Failed to fetch')))
  await expect(fetchFile('tamarack', CABLE)).rejects.toThrow(/'cable.s2p' could not be fetched.*no answer/)
})
