import { EDIT_ID, keyOfOperations } from './room/editKey'
import type { Rooms } from './rooms'
import type { Services } from './services'

/**
 * The way in for everything but a worksheet's socket (write path, rule 9). The operations are made into an update on a
 * document that follows everything accepted, under a client id of this person's for this budget, and then go the same way as
 * a page's edit.
 */
export function createSubmit(rooms: Rooms): Services['submit'] {
  return async (budget, identity, door, { editId, operations, expectedSeq }) => {
    const refused = (code: 'malformed' | 'not-allowed' | 'not-stored', reason: string) => ({ editId, code, reason })
    if (!EDIT_ID.test(editId)) return refused('malformed', "An edit id has 1 to 100 letters, digits, '.', '_' and '-'.")
    if (operations.length === 0) return refused('malformed', 'Give at least one operation.')
    const key = keyOrNull(editId, operations)
    if (!key) return refused('malformed', 'An operation holds a value that JSON cannot keep.')
    const room = await rooms.get(budget)
    if (room === null) return refused('not-allowed', 'This budget does not exist.')
    if ('locked' in room) return refused('not-stored', room.locked)
    // The check itself stands in the write path, where it is made again just before the commit.
    await room.enter(identity.person)
    return room.submit({ identity, door }, key, operations, expectedSeq ?? null)
  }
}

function keyOrNull(...[editId, operations]: Parameters<typeof keyOfOperations>) {
  try {
    return keyOfOperations(editId, operations)
  } catch {
    return null
  }
}
