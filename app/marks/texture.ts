import type { Assembly } from '../../lib/budget/schema'

export const TEXTURES = ['strata', 'heavy-strata', 'pins', 'dots', 'slant', 'blocks', 'plain'] as const
export type Texture = (typeof TEXTURES)[number]

const BY_KIND = {
  package: 'dots',
  cable: 'slant',
  'connector-family': 'pins',
  component: 'blocks',
} as const

/**
 * Textures of a budget's assemblies by id. Boards alternate between broken and heavy strata in the order in which the
 * signal first meets them, so that two boards that touch are told apart.
 */
export function texturesOf(
  assemblies: Readonly<Record<string, Pick<Assembly, 'kind'>>>,
  inChannelOrder: readonly (string | null)[],
): ReadonlyMap<string, Texture> {
  const textures = new Map<string, Texture>()
  let boards = 0
  for (const id of inChannelOrder) {
    const assembly = id === null ? undefined : assemblies[id]
    if (id === null || !assembly || textures.has(id)) continue
    if (assembly.kind === 'board') textures.set(id, boards++ % 2 === 0 ? 'strata' : 'heavy-strata')
    else textures.set(id, assembly.kind ? BY_KIND[assembly.kind] : 'plain')
  }
  return textures
}
