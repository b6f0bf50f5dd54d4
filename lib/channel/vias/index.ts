export { secondWave } from './barrel'
export { stubResonance } from './stub'
export { type Via, viaTwoPort } from './via'
