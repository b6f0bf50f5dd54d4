import { AssemblyTextures } from '../marks/AssemblyTexture'
import css from './diagram.module.css'
import type { Run } from './geometry'

/** Ground textures, stippled air, and the hatching of what nobody knows. */
export function Patterns({ id, runs }: { id: string; runs: readonly Run[] }) {
  return (
    <>
      <AssemblyTextures id={id} textures={['strata', ...runs.map((run) => run.texture)]} />
      <defs>
        <pattern id={`${id}-air`} width="8" height="8" patternUnits="userSpaceOnUse">
          <path d="M2 2h.01M6 6h.01" className={css.stipple} />
        </pattern>
        <pattern id={`${id}-gap`} width="9" height="9" patternUnits="userSpaceOnUse">
          <path d="M-2 2L2-2M0 9L9 0M7 11l4-4" className={css.hatch} />
        </pattern>
      </defs>
    </>
  )
}
