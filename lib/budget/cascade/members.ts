import type { Counted } from '../allowance/sum'
import type { LineItem } from '../lineItem'
import type { Piece } from '../models/piece'

/** A line of the sum that the cascade can join. */
export type Member = { readonly line: Counted; readonly piece: Piece }

/** A band that begins above this part of the allowance's frequency is too short to join or to fit. */
const BEGINS_BELOW = 0.25
/** A number holds within ±2 % of its frequency. */
const EDGE = 1.02

/** The line as a member of the cascade, if it is a piece of the channel and its data begin low enough and reach the allowance's frequency. */
export function joins(line: Counted, atHz: number): Member | null {
  const { piece, nominal } = line.loss
  if (piece === null || nominal === null || line.sign !== 1 || isReserve(line.item)) return null
  return piece.from <= BEGINS_BELOW * atHz && piece.to * EDGE >= atHz ? { line, piece } : null
}

/** Decibels held back at every frequency: no piece of the channel. */
export function isReserve({ line }: LineItem): boolean {
  return line.kind === 'reserve'
}
