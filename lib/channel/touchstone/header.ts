import { DEFAULT_OPTIONS, type Options } from './options'
import { Unreadable } from './unreadable'

export type MatrixFormat = 'full' | 'lower' | 'upper'
export type TwoPortOrder = '12_21' | '21_12'

/** What a file says about its data, as far as it has been read. */
export class Header {
  /** Of the [Version] line; null in version 1, which has none. */
  keywordVersion: '2.0' | '2.1' | null = null
  options: Options | null = null
  ports: number | null = null
  order: TwoPortOrder | null = null
  matrix: MatrixFormat = 'full'
  frequencies: number | null = null
  noiseFrequencies: number | null = null
  reference: number[] | null = null
  modes: string[] | null = null
}

/** The same, when the data begin: whole and without contradiction. */
export type Layout = {
  readonly version: '1.0' | '1.1' | '2.0' | '2.1'
  readonly options: Options
  readonly ports: number
  readonly order: TwoPortOrder
  readonly matrix: MatrixFormat
  /** Ω of each port. */
  readonly resistances: Float64Array
  readonly modes: readonly string[] | null
}

/** @param line on which the data begin. @throws Unreadable where something is missing or contradicts something else */
export function layoutOf(header: Header, line: number): Layout {
  const { keywordVersion, ports } = header
  if (ports === null)
    throw new Unreadable(line, 'The number of ports is missing; write [Number of Ports] before the data.')
  if (keywordVersion !== null && header.options === null)
    throw new Unreadable(line, 'The option line is missing; write one, such as # GHz S MA R 50, before the data.')
  const options = header.options ?? DEFAULT_OPTIONS
  const given = options.resistances
  if (given.length !== 1 && given.length !== ports)
    throw new Unreadable(
      options.line,
      `R has ${given.length} numbers for ${ports} ${ports === 1 ? 'port' : 'ports'}; write one for all or one for each.`,
    )
  if ((options.parameter === 'H' || options.parameter === 'G') && (ports !== 2 || header.modes))
    throw new Unreadable(
      options.line,
      `${options.parameter}-parameters are for two single-ended ports only; save the data as S-parameters.`,
    )
  if (keywordVersion !== null && ports === 2 && header.order === null)
    throw new Unreadable(
      line,
      'It is unknown whether S12 or S21 comes first; write [Two-Port Data Order] 12_21 or 21_12 before the data.',
    )
  if (header.reference && header.reference.length !== ports)
    throw new Unreadable(
      line,
      `[Reference] has ${header.reference.length} numbers for ${ports} ports; write one for each.`,
    )
  if (header.modes && header.modes.length !== ports)
    throw new Unreadable(line, `[Mixed-Mode Order] has ${header.modes.length} modes for ${ports} ports; write as many.`)
  return {
    version: keywordVersion ?? (given.length > 1 ? '1.1' : '1.0'),
    options,
    ports,
    order: header.order ?? (keywordVersion === null && ports === 2 ? '21_12' : '12_21'),
    matrix: header.matrix,
    resistances: Float64Array.from(
      { length: ports },
      (_, port) => (header.reference ?? given)[port] ?? (given[0] as number),
    ),
    modes: header.modes,
  }
}
