import type { Cell } from '../wire'

/** The server takes ten cells a second; an arrow key that is held down makes more. */
const PAUSE = 120

/** Sends the cell that a person is in: at once after a pause, else the last one when the pause is over. */
export function createCellSender(send: (cell: Cell | null) => void) {
  let cell: Cell | null = null
  let due = false
  let timer: ReturnType<typeof setTimeout> | null = null

  function now() {
    due = false
    send(cell)
    timer = setTimeout(() => {
      timer = null
      if (due) now()
    }, PAUSE)
  }
  return {
    set(next: Cell | null) {
      cell = next
      if (timer === null) now()
      else due = true
    },
    /** After a new connection. */
    repeat() {
      if (cell !== null) this.set(cell)
    },
    stop() {
      if (timer !== null) clearTimeout(timer)
      timer = null
      due = false
    },
  }
}
