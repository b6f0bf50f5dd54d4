import { formatScaled } from '../units'
import type { TouchstoneFile } from './file'
import type { Layout } from './header'
import { fullMatrices, toRealAndImaginary } from './matrices'
import { modeReferences } from './modes'
import type { Rows } from './rows'
import { scattering } from './scattering'
import { Unreadable } from './unreadable'
import type { Warnings } from './warnings'

/** Makes the network of what was read. @throws Unreadable where a matrix has no S-parameters */
export function finished(
  layout: Layout,
  rows: Rows,
  noise: Float64Array | null,
  comments: string,
  warnings: Warnings,
): TouchstoneFile {
  const { options, ports, version, modes } = layout
  const references = modes ? modeReferences(modes, layout.resistances, options.line) : layout.resistances
  const pairs = rows.pairs.all()
  toRealAndImaginary(pairs, options.format)
  const given = fullMatrices(pairs, ports, layout.matrix, layout.order)
  const s = options.parameter === 'S' ? given : converted(layout, given, references, rows, warnings)
  const beyond = s.findIndex((part) => !Number.isFinite(part))
  if (beyond >= 0) throw withoutS(rows, Math.floor(beyond / (2 * ports * ports)))
  const reference = new Float64Array(2 * ports)
  for (let port = 0; port < ports; port++) reference[2 * port] = references[port] as number
  return {
    network: { ports, hz: rows.hz.all(), s, reference },
    version,
    parameter: options.parameter,
    format: options.format,
    unit: options.unit,
    noise,
    mixedModeOrder: modes,
    comments,
    warnings: warnings.all(),
  }
}

/** Version 1 divides Z, Y, H and G by their units at R, so that they are those of ports of 1 Ω; version 2 has Ω and S. */
function converted(
  layout: Layout,
  given: Float64Array,
  references: Float64Array,
  rows: Rows,
  warnings: Warnings,
): Float64Array {
  const { parameter } = layout.options
  if (parameter === 'S') return given
  const normalised = layout.version === '1.0' || layout.version === '1.1'
  if (layout.version === '1.1')
    warnings.add(
      layout.options.line,
      `${parameter}-parameters were taken as normalised by √(Ri·Rj) of their ports; see whether they were saved so.`,
    )
  const at = normalised ? new Float64Array(references.length).fill(1) : references
  const { matrices, without } = scattering(parameter, given, at)
  if (without >= 0) throw withoutS(rows, without)
  return matrices
}

function withoutS(rows: Rows, point: number): Unreadable {
  return new Unreadable(
    rows.lines.at(point),
    `The values at ${formatScaled(rows.hz.at(point), 'frequency')} have no S-parameters, or ones too large to compute; take this frequency out.`,
  )
}
