import { randomBytes } from 'node:crypto'
import { mkdir, open, readFile } from 'node:fs/promises'
import { join } from 'node:path'

/** The key that signs cookies: made once, kept outside the databases, readable by the server's account alone. */
export async function readSecret(directory: string): Promise<string> {
  const folder = join(directory, 'keys')
  await mkdir(folder, { recursive: true, mode: 0o700 })
  const path = join(folder, 'cookie-secret')
  try {
    const file = await open(path, 'wx', 0o600)
    try {
      await file.writeFile(randomBytes(48).toString('base64url'))
      await file.sync()
    } finally {
      await file.close()
    }
  } catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'EEXIST')) throw error
  }
  const secret = await readFile(path, 'utf8')
  if (secret.length < 32)
    throw new Error(`${path} is damaged. Remove it and start again; everybody will have to sign in anew.`)
  return secret
}
