/** Content-Disposition of a file to be saved under its name (RFC 6266, RFC 8187), with an ASCII name for old programs. */
export function attachment(name: string): string {
  const plain = name.replace(/[^\w.\- ]/g, '_')
  const encoded = encodeURIComponent(name).replace(
    /['()*]/g,
    (character) => `%${character.charCodeAt(0).toString(16).toUpperCase()}`,
  )
  return `attachment; filename="${plain}"; filename*=UTF-8''${encoded}`
}
