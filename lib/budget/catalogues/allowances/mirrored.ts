import type { PlaneCode } from '../../schema'

/** Each plane's counterpart when the link is walked the other way. */
const MIRRORED: Readonly<Record<PlaneCode, PlaneCode>> = {
  'tx-die': 'rx-die',
  'tx-bump': 'rx-bump',
  'tx-ball': 'rx-ball',
  'rx-die': 'tx-die',
  'rx-bump': 'tx-bump',
  'rx-ball': 'tx-ball',
  'board-edge': 'board-edge',
  'connector-face': 'connector-face',
  'module-ball': 'module-ball',
  tp0: 'tp5',
  tp0d: 'tp5d',
  tp1: 'tp4',
  tp1a: 'tp4a',
  tp2: 'tp3',
  tp3: 'tp2',
  tp4: 'tp1',
  tp4a: 'tp1a',
  tp5: 'tp0',
  tp5d: 'tp0d',
}

export function mirrored(code: PlaneCode | null): PlaneCode | null {
  return code === null ? null : MIRRORED[code]
}
