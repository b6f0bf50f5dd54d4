import { type Budget, type BudgetFile, budgetSchema } from '../../lib/budget/schema'

type LineFile = NonNullable<BudgetFile['lines']>[string]

/** A measured line, stated at 10 GHz. */
export function line(order: string, loss: string | null, rest: Partial<LineFile> = {}): LineFile {
  return {
    order,
    name: `Line ${order}`,
    kind: 'other',
    model: 'stated',
    basis: 'measured',
    loss,
    at: '10 GHz',
    ...rest,
  }
}

/** A link of 20 Gb/s NRZ, Nyquist 10 GHz, 100 Ω, from TX ball (a0) to RX ball (z0), with one allowance of 12 dB and 1 dB of required margin. */
export function link(parts: Partial<BudgetFile>): Budget {
  return budgetSchema.parse({
    head: {
      schemaVersion: 1,
      name: 'Alder',
      bitRate: '20 Gb/s',
      rateType: 'line',
      code: 'NRZ',
      reference: '100 Ω',
      referenceTemperature: '25 °C',
    },
    planes: {
      tx: { order: 'a0', code: 'tx-ball', name: 'TX ball' },
      rx: { order: 'z0', code: 'rx-ball', name: 'RX ball' },
    },
    allowances: {
      limit: {
        order: 'a0',
        name: 'Ball to ball',
        limit: '12 dB',
        at: '10 GHz',
        from: 'tx',
        to: 'rx',
        requiredMargin: '1 dB',
      },
    },
    ...parts,
  } satisfies BudgetFile)
}
