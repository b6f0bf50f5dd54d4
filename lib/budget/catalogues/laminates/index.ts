export { LAMINATE_CLASSES } from './classes'
export { type LaminateEntry, laminateEntry } from './entry'
export { lineFromLaminate } from './lineFromLaminate'
