import { expect, test, vi } from 'vitest'
import { EvidenceReader } from '../../../../app/budgets/[id]/client/evaluation/reader'
import type { EvidenceNetwork } from '../../../../lib/budget/evaluation'
import type { NeededFile } from '../../../../lib/budget/evidence/needed'
import { networkLink, pending } from './links'

const UNREADABLE: EvidenceNetwork = { problem: 'Line 1: that is no number.' }

/** A reader whose files the test answers for, in the order in which they are asked for. */
function reader() {
  const asked: (ReturnType<typeof pending<EvidenceNetwork | null>> & { file: NeededFile })[] = []
  const opened = new EvidenceReader((file) => {
    const answer = { ...pending<EvidenceNetwork | null>(), file }
    asked.push(answer)
    return answer.promise
  })
  const told = vi.fn()
  opened.subscribe(told)
  const names = () => asked.map(({ file }) => file.sha256)
  const answer = async (k: number, how: EvidenceNetwork | null | Error) => {
    if (how instanceof Error) asked[k]?.reject(how)
    else asked[k]?.resolve(how)
    await Promise.allSettled([asked[k]?.promise])
    await Promise.resolve()
  }
  return { opened, told, names, answer, asked, state: opened.getSnapshot }
}

test('files are read one after the other, and each is shown when it has been read', async () => {
  const { opened, told, names, answer, state } = reader()
  opened.show(networkLink({ sha256: 'aa' }, { sha256: 'bb' }))
  expect(names()).toEqual(['aa'])
  expect(state().reading).toBe(true)
  await answer(0, UNREADABLE)
  const first = state().networks
  expect([...first.keys()]).toEqual(['aa'])
  expect(state().reading).toBe(true)
  await answer(1, UNREADABLE)
  expect(names()).toEqual(['aa', 'bb'])
  expect(state().networks).not.toBe(first)
  expect([...state().networks.keys()]).toEqual(['aa', 'bb'])
  expect(state().reading).toBe(false)
  expect(told).toHaveBeenCalledTimes(3)
})

test('an edit that needs no other file reads nothing and tells nobody', async () => {
  const { opened, told, names, answer, state } = reader()
  const budget = networkLink({ sha256: 'aa' })
  opened.show(budget)
  await answer(0, UNREADABLE)
  const { networks } = state()
  told.mockClear()
  opened.show({ ...budget, head: { ...budget.head, name: 'Birch' } })
  opened.show(networkLink())
  opened.show(networkLink({ sha256: 'aa' }))
  expect(names()).toEqual(['aa'])
  expect(state().networks).toBe(networks)
  expect(told).not.toHaveBeenCalled()
})

test('a file whose line is gone before its turn is not read', async () => {
  const { opened, names, answer } = reader()
  opened.show(networkLink({ sha256: 'aa' }, { sha256: 'bb' }))
  opened.show(networkLink({ sha256: 'cc' }))
  await answer(0, UNREADABLE)
  expect(names()).toEqual(['aa', 'cc'])
})

test('another ending of the name is another number of ports, and is read again', async () => {
  const { opened, asked, answer } = reader()
  opened.show(networkLink({ sha256: 'aa', name: 'cable.s2p' }))
  await answer(0, UNREADABLE)
  opened.show(networkLink({ sha256: 'aa', name: 'backplane.s2p' }))
  opened.show(networkLink({ sha256: 'aa', name: 'backplane.s4p' }))
  expect(asked.map(({ file }) => file.name)).toEqual(['cable.s2p', 'backplane.s4p'])
})

test('what failed is tried with the next state of the budget, and stops nothing meanwhile', async () => {
  const { opened, names, answer, state } = reader()
  const budget = networkLink({ sha256: 'aa' }, { sha256: 'bb' })
  opened.show(budget)
  await answer(0, new Error('no answer'))
  await answer(1, UNREADABLE)
  expect(state().reading).toBe(false)
  expect([...state().networks.keys()]).toEqual(['bb'])
  opened.show(budget)
  expect(names()).toEqual(['aa', 'bb'])
  opened.show({ ...budget })
  expect(names()).toEqual(['aa', 'bb', 'aa'])
})

test('what the server does not have is asked for again once the list of files has changed', async () => {
  const { opened, names, answer } = reader()
  const budget = networkLink({ sha256: 'aa' })
  opened.show(budget)
  await answer(0, null)
  opened.show({ ...budget })
  expect(names()).toEqual(['aa'])
  opened.show({ ...budget, evidence: { ...budget.evidence } })
  expect(names()).toEqual(['aa', 'aa'])
})
