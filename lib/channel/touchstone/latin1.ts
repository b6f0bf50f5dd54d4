/** The characters of the bytes from `from` to `to`, one each. */
export function latin1(bytes: Uint8Array, from: number, to: number): string {
  let text = ''
  for (let at = from; at < to; at++) text += String.fromCharCode(bytes[at] as number)
  return text
}
