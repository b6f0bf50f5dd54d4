import type { StartThread } from './thread'

/** Starts the worker of this page. */
export const startWorker: StartThread = ({ heard, lost }) => {
  const worker = new Worker(new URL('./worker.ts', import.meta.url), { type: 'module' })
  worker.addEventListener('message', ({ data }) => heard(data))
  // Without a message: the browser did not load it.
  worker.addEventListener('error', ({ message }) => lost(message || 'it could not be loaded'))
  worker.addEventListener('messageerror', () => lost('its answer could not be read'))
  return { send: (question) => worker.postMessage(question), stop: () => worker.terminate() }
}
