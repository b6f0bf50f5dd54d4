import type { Budget, BudgetFile } from '../../../../lib/budget/schema'
import { link } from '../../../budget/links'

/** A pair saved as two ports that loses 3 dB everywhere; by definition that is −20 log10 |S21|. */
export const THREE_DB = touchstone(3)

/** A short matched pair of 100 Ω that loses so much at every frequency. */
function touchstone(lossDb: number): string {
  const rows = [1, 5, 10, 15, 20].map((ghz) => `${ghz} -60 0 -${lossDb} -${ghz} -${lossDb} -${ghz} -60 0`)
  return ['! Invented', '# GHz S DB R 100', ...rows, ''].join('\n')
}

export const bytesOf = (text: string) => new TextEncoder().encode(text)

/** A link of 20 Gb/s NRZ (Nyquist frequency 10 GHz) with one network line for each file, in order. */
export function networkLink(...files: readonly { readonly sha256: string; readonly name?: string }[]): Budget {
  const lines: NonNullable<BudgetFile['lines']> = {}
  const evidence: NonNullable<BudgetFile['evidence']> = {}
  files.forEach(({ sha256, name = 'cable.s2p' }, k) => {
    evidence[`file${k}`] = { order: `a${k}`, name, sha256, modes: 'mixed-as-two-ports', fixtures: 'none' }
    lines[`line${k}`] = { order: `b${k}`, kind: 'other', model: 'network', taken: 'discrete', evidence: `file${k}` }
  })
  return link({ lines, evidence })
}

/** A promise that the test settles. */
export function pending<T>() {
  let resolve: (value: T) => void = () => {}
  let reject: (error: Error) => void = () => {}
  const promise = new Promise<T>((yes, no) => {
    resolve = yes
    reject = no
  })
  return { promise, resolve, reject }
}
