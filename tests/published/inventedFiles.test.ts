import { readdirSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { expect, it } from 'vitest'
import { INVENTED_FILES } from './inventedFiles'

const FOLDER = fileURLToPath(new URL('../../seed-scenarios', import.meta.url))

it('the folder has the invented files and no other network', () => {
  const networks = readdirSync(FOLDER).filter((name) => /\.s\d+p$/.test(name))
  expect(networks.sort()).toEqual(Object.keys(INVENTED_FILES).sort())
})

// After a change on purpose: 'npm test -- tests/published/inventedFiles -u', then the SHA-256 and size in the budget file.
it.each(Object.entries(INVENTED_FILES))(
  '%s is what its invention computes, byte for byte, under 60 kB',
  async (name, make) => {
    const text = make()
    expect(text.length).toBeLessThan(60_000)
    expect(text.split('\n')[0]).toContain('Invented for the demonstration')
    await expect(text).toMatchFileSnapshot(`${FOLDER}/${name}`)
  },
)
