import type { ComponentProps } from 'react'

/**
 * The parts of a grid. They are not table elements: a row becomes a card on a narrow screen, a visible column holds several
 * cells, and browsers forget a table's own roles once it is laid out as anything else.
 */
type Div = ComponentProps<'div'>

// biome-ignore lint/a11y/useSemanticElements: see above
export const Grid = (props: Div) => <div role="grid" {...props} />

// biome-ignore lint/a11y/useSemanticElements: see above
// biome-ignore lint/a11y/useFocusableInteractive: the focus goes to its cells
export const Row = (props: Div) => <div role="row" {...props} />

// biome-ignore lint/a11y/useSemanticElements: see above
// biome-ignore lint/a11y/useFocusableInteractive: those that may be acted on bring their own tabIndex
export const Cell = (props: Div) => <div role="gridcell" {...props} />

// biome-ignore lint/a11y/useSemanticElements: see above
// biome-ignore lint/a11y/useFocusableInteractive: brings its own tabIndex
export const RowHeader = (props: Div) => <div role="rowheader" {...props} />

// biome-ignore lint/a11y/useSemanticElements: see above
// biome-ignore lint/a11y/useFocusableInteractive: heads are read, not acted on
export const ColumnHeader = (props: Div) => <div role="columnheader" {...props} />
