import { describe, expect, it } from 'vitest'
import { savedWords } from '../../../app/budgets/[id]/client/head/savedWords'

const time = new Date('2026-12-01T14:32:07').getTime()
const connection = (state: 'connecting' | 'live' | 'offline' | 'closed', words = 'words') => ({
  state,
  words,
  code: null,
})
const facts = {
  connection: connection('live'),
  unsaved: 0,
  lastAcknowledged: { seq: 7, time },
  role: 'editor',
  durable: true,
  fault: null,
} as const

describe('what the header says about saving', () => {
  it('says saved only with an empty outbox and an open line', () => {
    expect(savedWords(facts)).toEqual({
      title: 'Everything saved',
      detail: 'last acknowledged 14:32:07',
      tone: 'still',
    })
    for (const state of ['connecting', 'offline', 'closed'] as const)
      for (const unsaved of [0, 1, 2])
        expect(savedWords({ ...facts, connection: connection(state), unsaved }).title).not.toMatch(/everything saved/i)
    expect(savedWords({ ...facts, unsaved: 1 }).title).toBe('1 change not yet saved, kept on this computer')
  })
  it('counts what is kept on this computer, offline and closed alike', () => {
    expect(savedWords({ ...facts, connection: connection('offline'), unsaved: 2 }).title).toBe(
      '2 changes not yet saved, kept on this computer',
    )
    expect(savedWords({ ...facts, connection: connection('closed', 'Sign in again.'), unsaved: 2 })).toEqual({
      title: '2 changes not yet saved, kept on this computer',
      detail: 'Sign in again.',
      tone: 'stopped',
    })
  })
  it('does not promise to keep what this browser forgets', () => {
    expect(savedWords({ ...facts, unsaved: 1, durable: false }).title).toMatch(/only while this page is open/)
    expect(savedWords({ ...facts, fault: 'The disk is full.' })).toMatchObject({
      detail: 'The disk is full.',
      tone: 'stopped',
    })
  })
  it('claims no acknowledgement where there was none', () => {
    expect(savedWords({ ...facts, lastAcknowledged: null }).detail).toBe('nothing changed here yet')
  })
})
