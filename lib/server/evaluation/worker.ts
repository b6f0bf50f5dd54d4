import { parentPort, workerData } from 'node:worker_threads'
import { answer } from './answer'
import { EvidenceLibrary } from './library'
import type { Question } from './message'

/** The thread that evaluates for the server. One question at a time, in the order of the queue. */
const library = new EvidenceLibrary(String(workerData))
parentPort?.on('message', async (question: Question) => parentPort?.postMessage(await answer(library, question)))
