import type { Network } from '../networks/network'

export type Parameter = 'S' | 'Y' | 'Z' | 'H' | 'G'
/** Real and imaginary part; magnitude and degrees; decibels (20 log10) and degrees. */
export type Format = 'RI' | 'MA' | 'DB'
export type Unit = 'Hz' | 'kHz' | 'MHz' | 'GHz'

/** What was read all the same, and how; null where it is about the whole file. */
export type TouchstoneWarning = { readonly line: number | null; readonly message: string }

export type TouchstoneFile = {
  /**
   * S-parameters in the file's own references, one matrix row a port; with a mixed-mode order one row a mode, whose
   * reference is twice (differential) or half (common) that of its ports.
   */
  readonly network: Network
  /** 1.1 where version 1 gives a reference for each port; for version 2 what [Version] says. */
  readonly version: '1.0' | '1.1' | '2.0' | '2.1'
  /** What the file holds; the network is in S whatever it holds. */
  readonly parameter: Parameter
  readonly format: Format
  readonly unit: Unit
  /** Five numbers a row: Hz, least noise figure in dB, magnitude and degrees of Γopt, Rn in Ω. */
  readonly noise: Float64Array | null
  /** The modes of the matrix rows as [Mixed-Mode Order] names them, such as D2,3: port 2 minus port 3. */
  readonly mixedModeOrder: readonly string[] | null
  /** The first 4,096 bytes of comments, a line each. */
  readonly comments: string
  readonly warnings: readonly TouchstoneWarning[]
}

/** Why a file was not read: the line (from 1; null where it is about the whole file) and a sentence that says what to do. */
export type TouchstoneProblem = { readonly line: number | null; readonly message: string }
