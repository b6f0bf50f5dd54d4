import { mixedMode } from './mixedMode'
import type { Network } from './network'
import type { PortMap } from './portMap'

/**
 * The two-port that a map chooses out of a network. Of pairs it is Sdd (port 1 is `from`), at twice the reference of the single-ended
 * ports, the common mode and all other ports matched. Of single ports it is what they are, at their own references: the caller
 * knows whether a file of two ports is single-ended or already differential.
 * @throws RangeError for a port that the network has not
 */
export function differentialTwoPort(network: Network, map: PortMap): Network {
  const { from, to } = map
  if (from.length === 1 || to.length === 1) return chosenPorts(network, [from[0], to[0]])
  const pairs = chosenPorts(network, [...from, ...to])
  const modes = mixedMode(pairs, [
    [0, 1],
    [2, 3],
  ])
  return chosenPorts(modes, [0, 1])
}

/** The network of some of the ports, the others closed with their references. */
function chosenPorts(network: Network, chosen: readonly number[]): Network {
  const { ports, hz } = network
  if (chosen.length === ports && chosen.every((port, k) => port === k)) return network
  const absent = chosen.find((port) => !(port >= 0 && port < ports))
  if (absent !== undefined) throw new RangeError(`Port ${absent + 1} of a network of ${ports} ports.`)
  const n = chosen.length
  const s = new Float64Array(2 * n * n * hz.length)
  const reference = new Float64Array(2 * n)
  for (const [row, from] of chosen.entries()) {
    reference[2 * row] = network.reference[2 * from] as number
    reference[2 * row + 1] = network.reference[2 * from + 1] as number
    for (const [column, driven] of chosen.entries())
      for (let k = 0; k < hz.length; k++) {
        const source = 2 * ((k * ports + from) * ports + driven)
        const target = 2 * ((k * n + row) * n + column)
        s[target] = network.s[source] as number
        s[target + 1] = network.s[source + 1] as number
      }
  }
  return { ports: n, hz, s, reference }
}
