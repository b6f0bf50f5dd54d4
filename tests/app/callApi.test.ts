import { afterEach, describe, expect, it, vi } from 'vitest'
import { beside } from '../../app/form/client/beside'
import { callApi, problemOf } from '../../app/form/client/callApi'

const answered = (status: number, headers: Record<string, string> = {}) => ({ status, headers: new Headers(headers) })

afterEach(() => vi.unstubAllGlobals())

/** Outside source: RFC 9457, problem details (title, status, detail, extension members). */
describe('a problem of the API in words', () => {
  it('is its title with what to do; the detail is more exact than the general advice', () => {
    const json = { title: 'The budget has moved on', todo: 'Read it again.', code: 'conflict' }
    expect(problemOf(json, answered(409)).sentence).toBe('The budget has moved on. Read it again.')
    const exact = { ...json, detail: 'It stands at 12.' }
    expect(problemOf(exact, answered(409)).sentence).toBe('The budget has moved on. It stands at 12.')
  })

  it('puts the sentences of fields beside them, the first of each', () => {
    const errors = [
      { field: 'email', todo: 'Type an address.' },
      { field: 'email', todo: 'Second.' },
      { field: 'name', todo: 'Type something.' },
      { field: 3, todo: 'odd' },
      null,
    ]
    const problem = problemOf({ title: 'Some fields', code: 'invalid-fields', errors }, answered(422))
    expect(problem.fields).toEqual({ email: 'Type an address.', name: 'Type something.' })
  })

  it('says how long to wait (RFC 9110, Retry-After in seconds)', () => {
    const json = { title: 'Too many wrong passwords', code: 'slow-down', todo: 'Wait.' }
    const { sentence } = problemOf(json, answered(429, { 'retry-after': '30' }))
    expect(sentence).toBe('Too many wrong passwords. Wait 30 seconds, then try again.')
  })

  it('believes nothing about what a proxy in between may send', () => {
    for (const json of [null, 'Bad gateway', 7, [], { title: 3, errors: 'x', code: {} }]) {
      expect(problemOf(json, answered(502))).toMatchObject({ code: 'status-502', fields: {} })
    }
  })
})

describe('a problem that concerns one field', () => {
  const problem = { code: 'e-mail-taken', sentence: 'Somebody has it already.', fields: {} }

  it('stands beside that field; others stay with the form', () => {
    const placed = beside({ ok: false, problem }, { 'e-mail-taken': 'email' })
    expect(placed).toMatchObject({ ok: false, problem: { fields: { email: 'Somebody has it already.' } } })
    const other = { ok: false, problem: { ...problem, code: 'internal' } } as const
    expect(beside(other, { 'e-mail-taken': 'email' })).toBe(other)
  })
})

describe('calling the API', () => {
  it('never throws: a server that does not answer is a sentence', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')))
    const answer = await callApi('POST', '/api/v1/session', {})
    expect(answer).toMatchObject({ ok: false, problem: { code: 'no-answer' } })
  })

  it('takes 204 without a body', async () => {
    vi.stubGlobal('fetch', () => Promise.resolve(new Response(null, { status: 204 })))
    expect(await callApi('DELETE', '/api/v1/session')).toEqual({ ok: true, json: null })
  })
})
