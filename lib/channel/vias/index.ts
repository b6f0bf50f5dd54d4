export { secondWave } from './barrel'
export { padExcess } from './pads'
export { stubResonance } from './stub'
export { type Via, viaTwoPort } from './via'
