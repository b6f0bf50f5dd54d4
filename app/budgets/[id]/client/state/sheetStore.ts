import {
  browserLocks,
  openBrowserStorage,
  openSheet,
  type SheetOptions,
  type SheetSession,
} from '../../../../../lib/sheet/session'

/** How long a session outlives the last component that used it: React mounts twice in development, and pages come back. */
const GRACE_MS = 5_000

type Held = { readonly session: Promise<SheetSession>; holders: number; timer: ReturnType<typeof setTimeout> | null }
type Opening = Pick<SheetOptions, 'budget' | 'person' | 'trail'>

const held = new Map<string, Held>()

/**
 * Borrows the session of one person and budget; it is opened once, whoever asks, and destroyed when nobody has held it for
 * a while. Lives outside React.
 */
export function holdSheet(
  opening: Opening,
  open: (opening: Opening) => Promise<SheetSession> = openInBrowser,
): { readonly session: Promise<SheetSession>; release(): void } {
  const key = `${opening.person}/${opening.budget}`
  const known = held.get(key) ?? { session: open(opening), holders: 0, timer: null }
  held.set(key, known)
  known.holders++
  if (known.timer !== null) clearTimeout(known.timer)
  known.timer = null
  let released = false
  return {
    session: known.session,
    release() {
      if (released) return
      released = true
      known.holders--
      if (known.holders > 0) return
      known.timer = setTimeout(() => {
        held.delete(key)
        void known.session.then((session) => session.destroy())
      }, GRACE_MS)
    },
  }
}

async function openInBrowser(opening: Opening): Promise<SheetSession> {
  const { protocol, host } = window.location
  return openSheet({
    ...opening,
    url: `${protocol === 'https:' ? 'wss' : 'ws'}://${host}/collab`,
    storage: await openBrowserStorage(opening.person, opening.budget),
    locks: browserLocks(),
  })
}
