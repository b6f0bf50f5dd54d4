export { type FitForm, type FitOptions, type FittedLoss, fittedLoss } from './fittedLoss'
export { weightedDeviation } from './weightedDeviation'
