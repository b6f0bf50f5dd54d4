export { padCorner, shuntCapacitance } from './shuntCapacitance'
