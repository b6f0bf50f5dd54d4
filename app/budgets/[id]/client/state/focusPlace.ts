/** A record, a field of it, or a section as a whole (id null). */
export type Goal = { readonly section: string; readonly id: string | null; readonly field: string | null }

/**
 * Puts the focus on a place, wherever on the page it can be typed: in the rows before the detail.
 * @returns false where it is not on the page (yet)
 */
export function focusPlace(root: ParentNode, goal: Goal): boolean {
  const found = candidates(goal).flatMap((selector) => [...root.querySelectorAll<HTMLElement>(selector)])
  const element = found.find((each) => each.checkVisibility()) ?? found.find(unfolded)
  if (!element) return false
  const own = element.hasAttribute('tabindex') && element.dataset.editing === undefined
  const target = own ? element : controlIn(element)
  element.scrollIntoView({ block: 'nearest' })
  target?.focus({ preventScroll: true })
  return true
}

/** Opens what an element is folded into. @returns whether it can be seen now (on a narrow screen some fields cannot) */
function unfolded(element: HTMLElement): boolean {
  const folds = enclosing(element).filter((details) => !details.open)
  for (const details of folds) details.open = true
  if (element.checkVisibility()) return true
  for (const details of folds) details.open = false
  return false
}

function enclosing(element: Element): readonly HTMLDetailsElement[] {
  const details = element.closest('details')
  const above = details?.parentElement
  return details ? [details, ...(above ? enclosing(above) : [])] : []
}

const controlIn = (element: HTMLElement) => element.querySelector<HTMLElement>('input, select, textarea, button')

function candidates({ section, id, field }: Goal): readonly string[] {
  const place = (key: string) => `[data-place="${CSS.escape(key)}"]`
  if (section === 'laneValues') return [place(`lines/${id}/${field?.split('/')[1] ?? ''}`), place(`lines/${id}/`)]
  const record = `${section}/${id ?? ''}/`
  // Both sides of a tolerance stand in one slip, which is named after its upper side.
  const named = field === 'toleranceMinus' ? 'tolerancePlus' : field
  const exact = named === null ? [] : [place(record + named), place(`${record}${named}@row`)]
  return [...exact, place(record), `[data-place^="${CSS.escape(record)}"]`]
}

/** The place that an element belongs to, from its `data-place`, or null. */
export function placeOf(element: Element): Goal | null {
  const key = element.closest<HTMLElement>('[data-place]')?.dataset.place?.replace(/@row$/, '')
  const parts = key === undefined ? null : /^([^/]+)\/([^/]*)\/(.*)$/.exec(key)
  if (!parts) return null
  const [, section = '', id = '', field = ''] = parts
  return { section, id: id || null, field: field === '' || field === 'flags' || field === 'add' ? null : field }
}
