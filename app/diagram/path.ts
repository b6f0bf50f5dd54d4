import type { Point } from './geometry'

/** Coordinates to a tenth of a px: the same picture from server and browser, and a short page. */
export const px = (value: number): number => Math.round(value * 10) / 10

export const pathOf = (points: readonly Point[], closed = false): string =>
  points.map(({ x, y }, at) => `${at === 0 ? 'M' : 'L'}${px(x)} ${px(y)}`).join('') + (closed ? 'Z' : '')
