import { type LimitPiece, TERMS, type Term } from './piece'

/** Writes pieces as parseCurve reads them, to the last digit: '0.05..6 GHz: 0.8 + 5.5 sqrt(f) - 0.01 f^3'. */
export function writeCurve(pieces: readonly LimitPiece[]): string {
  return pieces.map((piece) => `${gigahertz(piece.fromHz)}..${gigahertz(piece.toHz)} GHz: ${formula(piece)}`).join('; ')
}

function formula(piece: LimitPiece): string {
  let text = ''
  for (const term of Object.keys(TERMS) as Term[]) {
    const coefficient = piece[term]
    if (coefficient === 0) continue
    const sign = text === '' ? (coefficient < 0 ? '-' : '') : coefficient < 0 ? ' - ' : ' + '
    text += `${sign}${Math.abs(coefficient)}${TERMS[term]}`
  }
  return text === '' ? '0' : text
}

/** Hz as decimal digits of GHz. The point is moved in the digits: dividing by 1e9 would round. */
function gigahertz(hz: number): string {
  const [digits = '0', exponent = '0'] = hz.toExponential().split('e')
  const exact = `${digits}e${Number(exponent) - 9}`
  const plain = String(Number(exact))
  return Number(`${plain}e9`) === hz ? plain : exact
}
