/** Where the keys lead in the rows. Cells of a row are named by their field; rows may have different ones. */
export type Grid = readonly (readonly string[])[]
export type Spot = { readonly row: number; readonly cell: number }

/** Rows that Page Up and Page Down pass. */
const PAGE = 10

/**
 * The cell that a key leads to, or null where the key leads nowhere (and the browser may do what it does with it).
 * Up and down keep the field where the other row has it, else the place in the row. Tab goes along the row and, after
 * its last cell, out of the rows: nobody is caught in them.
 */
export function moveIn(grid: Grid, at: Spot, key: string, held: { ctrl: boolean; shift: boolean }): Spot | null {
  const cells = grid[at.row] ?? []
  switch (key) {
    case 'ArrowLeft':
      return within(cells, at, at.cell - 1)
    case 'ArrowRight':
      return within(cells, at, at.cell + 1)
    case 'Tab':
      return within(cells, at, at.cell + (held.shift ? -1 : 1))
    case 'ArrowUp':
      return toRow(grid, at, at.row - 1)
    case 'ArrowDown':
      return toRow(grid, at, at.row + 1)
    case 'PageUp':
      return toRow(grid, at, Math.max(0, at.row - PAGE))
    case 'PageDown':
      return toRow(grid, at, Math.min(grid.length - 1, at.row + PAGE))
    case 'Home':
      return { row: held.ctrl ? 0 : at.row, cell: 0 }
    case 'End': {
      const row = held.ctrl ? grid.length - 1 : at.row
      return { row, cell: Math.max(0, (grid[row]?.length ?? 1) - 1) }
    }
    default:
      return null
  }
}

const within = (cells: readonly string[], at: Spot, cell: number) =>
  cell < 0 || cell >= cells.length ? null : { row: at.row, cell }

function toRow(grid: Grid, at: Spot, row: number): Spot | null {
  const cells = grid[row]
  if (!cells || cells.length === 0) return null
  const same = cells.indexOf(grid[at.row]?.[at.cell] ?? '')
  return { row, cell: same >= 0 ? same : Math.min(at.cell, cells.length - 1) }
}

/** The row to go to when one is gone: itself if it is still there, else the next of those after it, else before it. */
export function nearestRow(gone: string, before: readonly string[], now: readonly string[]): string | null {
  const at = before.indexOf(gone)
  const near = [gone, ...before.slice(at + 1), ...before.slice(0, Math.max(at, 0)).reverse()]
  return near.find((row) => now.includes(row)) ?? now[0] ?? null
}
