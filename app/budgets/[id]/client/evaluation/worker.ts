import { answer, handedOver } from './answer'
import { fetchFile } from './fetchFile'
import { EvidenceLibrary } from './library'
import type { Question } from './message'

/** The browser's worker of one budget: reads its evidence files, and evaluates in full. */
const library = new EvidenceLibrary(fetchFile)
self.addEventListener('message', async ({ data }: MessageEvent<Question>) => {
  const given = await answer(library, data)
  self.postMessage(given, { transfer: handedOver(given) })
})
