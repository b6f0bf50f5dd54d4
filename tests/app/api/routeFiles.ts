import { readdir } from 'node:fs/promises'
import { join, resolve } from 'node:path'
import type { Route } from '../../../app/api/wrapper'

const root = resolve(import.meta.dirname, '../../../app')

export type Found = { readonly file: string; readonly path: string; readonly method: string; readonly route: Route }

/** Every handler of every route file of app, found on disk and not from a list that somebody keeps. */
export async function routeFiles(): Promise<{ file: string; path: string; exports: Record<string, unknown> }[]> {
  const files = (await readdir(root, { recursive: true })).filter((file) => /(^|\/)route\.tsx?$/.test(file)).sort()
  return Promise.all(
    files.map(async (file) => ({
      file: `app/${file}`,
      path: `/${file.replace(/\/?route\.tsx?$/, '').replace(/\[(\w+)\]/g, '{$1}')}`,
      exports: (await import(join(root, file))) as Record<string, unknown>,
    })),
  )
}

export async function routes(): Promise<Found[]> {
  return (await routeFiles()).flatMap(({ file, path, exports }) =>
    Object.entries(exports)
      .filter(([name]) => name !== 'dynamic')
      .map(([method, route]) => ({ file, path, method, route: route as Route })),
  )
}
