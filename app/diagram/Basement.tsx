import { textureFill } from '../marks/AssemblyTexture'
import { GlyphShape } from '../marks/DisciplineGlyph'
import css from './diagram.module.css'
import type { LevelGeometry } from './geometry'
import { px } from './path'
import { workWidth } from './text'

/** The ground: its surface is the limit, its textures the assemblies, with whose line it is along the surface. */
export function Basement({ id, geometry }: { id: string; geometry: LevelGeometry }) {
  const { runs, glyphs, surface, plot, height } = geometry
  return (
    <>
      {runs.map((run, at) => (
        <g key={`${run.assembly ?? 'none'}-${px(run.x)}`}>
          <rect
            x={px(run.x)}
            y={px(run.y)}
            width={px(run.width)}
            height={px(run.height)}
            fill={textureFill(id, run.texture)}
          />
          {at > 0 && <path d={`M${px(run.x)} ${px(run.y)}V${height}`} className={css.seam} />}
          {run.label && <RunLabel text={run.label} x={run.x + run.width / 2} y={height - 14} />}
        </g>
      ))}
      {surface && (
        <path
          d={`M${px(plot.x)} ${px(surface.y)}H${px(plot.x + plot.width)}`}
          className={surface.broken ? css.surfaceBroken : css.surface}
        />
      )}
      {glyphs.map((glyph) => {
        const digits = glyph.number === null ? 0 : workWidth(String(glyph.number), 13) + 3
        return (
          <g key={glyph.id} transform={`translate(${px(glyph.x)} ${px(glyph.y)})`}>
            <rect x={-9} y={-9} width={px(18 + digits)} height={18} rx={9} className={css.chip} />
            {glyph.owner && (
              <g transform="translate(-6 -6) scale(0.857)">
                <GlyphShape owner={glyph.owner} />
              </g>
            )}
            {glyph.number !== null && (
              <text x={9} y={4.5} className={css.chipNumber}>
                {glyph.number}
              </text>
            )}
          </g>
        )
      })}
    </>
  )
}

function RunLabel({ text, x, y }: { text: string; x: number; y: number }) {
  const width = workWidth(text, 13) + 12
  return (
    <>
      <rect x={px(x - width / 2)} y={y - 14} width={px(width)} height={19} className={css.runPlate} />
      <text x={px(x)} y={y} className={css.runLabel}>
        {text}
      </text>
    </>
  )
}
