import css from './marks.module.css'
import type { Texture } from './texture'

/** Patterns of ground. `id` must be unique on the page: two drawings may stand side by side. */
export function AssemblyTextures({ id, textures }: { id: string; textures: readonly Texture[] }) {
  return (
    <defs>
      {[...new Set(textures)].map((texture) => (
        <Pattern key={texture} id={textureId(id, texture)} texture={texture} />
      ))}
    </defs>
  )
}

export const textureId = (id: string, texture: Texture) => `${id}-${texture}`
export const textureFill = (id: string, texture: Texture) => `url(#${textureId(id, texture)})`

const SIZE: Readonly<Record<Texture, readonly [number, number]>> = {
  strata: [44, 18],
  'heavy-strata': [40, 11],
  pins: [6, 8],
  dots: [7, 7],
  slant: [14, 14],
  blocks: [18, 14],
  plain: [8, 8],
}

const MARKS: Readonly<Record<Texture, string>> = {
  strata: 'M0 4h26M31 4h9M6 10h17M28 10h16M0 16h12M17 16h27',
  'heavy-strata': 'M0 4h40M0 9h40',
  pins: 'M3 0v8',
  dots: 'M1.5 2h.01M5 5.5h.01',
  slant: 'M-2 2L2-2M0 14L14 0M12 16l4-4',
  blocks: 'M3 4h7v5H3z',
  plain: '',
}

function Pattern({ id, texture }: { id: string; texture: Texture }) {
  const [width, height] = SIZE[texture]
  return (
    <pattern id={id} width={width} height={height} patternUnits="userSpaceOnUse">
      <rect width={width} height={height} className={css.soil} />
      <path d={MARKS[texture]} className={`${css.seam} ${css[`seam-${texture}`]}`} />
    </pattern>
  )
}
