export type Complex = { readonly re: number; readonly im: number }
export type ClearPoint = { readonly hz: number; readonly s: readonly (readonly Complex[])[] }

const UNITS: Record<string, string> = { hz: 'e0', khz: 'e3', mhz: 'e6', ghz: 'e9' }

/**
 * The shortest clear reader of Touchstone version 1, S-parameters without noise data: split, Number(), one object a complex number.
 * What lib/channel/touchstone reads is compared with it, and so is its speed.
 */
export function readClearly(text: string, ports: number): { ohm: number; points: ClearPoint[] } {
  const lines = text.split(/\r\n|\r|\n/).map((line) => line.replace(/!.*/, '').trim())
  const options = (lines.find((line) => line.startsWith('#')) ?? '').slice(1).trim().toLowerCase().split(/\s+/)
  const unit = options.map((word) => UNITS[word]).find((exponent) => exponent) ?? 'e9'
  const format = options.find((word) => ['ri', 'ma', 'db'].includes(word)) ?? 'ma'
  const ohm = options.includes('r') ? Number(options[options.indexOf('r') + 1]) : 50
  const words = lines.filter((line) => line && !line.startsWith('#')).flatMap((line) => line.split(/\s+/))
  const size = 1 + 2 * ports * ports
  const points: ClearPoint[] = []
  for (let from = 0; from < words.length; from += size) {
    const element = (row: number, column: number) => {
      const place = ports === 2 ? column * ports + row : row * ports + column
      return complex(Number(words[from + 1 + 2 * place]), Number(words[from + 2 + 2 * place]), format)
    }
    const s = range(ports).map((row) => range(ports).map((column) => element(row, column)))
    points.push({ hz: moved(words[from] ?? '', unit), s })
  }
  return { ohm, points }
}

function complex(first: number, second: number, format: string): Complex {
  if (format === 'ri') return { re: first, im: second }
  const size = format === 'db' ? 10 ** (first / 20) : first
  const angle = second * (Math.PI / 180)
  return { re: size * Math.cos(angle), im: size * Math.sin(angle) }
}

/** The number that the text names, in Hz, rounded once. */
function moved(text: string, unit: string): number {
  const [digits, exponent = '0'] = text.toLowerCase().split('e')
  return Number(`${digits}e${Number(exponent) + Number(unit.slice(1))}`)
}

function range(count: number): number[] {
  return Array.from({ length: count }, (_, index) => index)
}
