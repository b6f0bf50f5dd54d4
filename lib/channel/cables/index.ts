export { bulkAttenuation, type CableTerms } from './bulk'
export { twinaxFloor, wireDiameter } from './twinax'
