import type { SVGProps } from 'react'

type Props = Omit<SVGProps<SVGSVGElement>, 'width' | 'height'> & {
  /** What it says to who cannot see it; null where a word beside it says the same. */
  readonly label: string | null
  /** Size in px; `box` is the drawing's own, if it differs. */
  readonly width: number
  readonly height: number
  readonly box?: readonly [number, number]
}

/** The frame of every small drawing: either named, or hidden from assistive technology. */
export function Mark({ label, width, height, box = [width, height], children, ...rest }: Props) {
  const frame = { width, height, viewBox: `0 0 ${box[0]} ${box[1]}`, focusable: false, ...rest }
  if (label === null) {
    return (
      <svg {...frame} aria-hidden="true">
        {children}
      </svg>
    )
  }
  return (
    <svg {...frame} role="img" aria-label={label}>
      {children}
    </svg>
  )
}
