export { groupedRootSumSquare } from './grouped'
export { extremeOf, type Meaning, sigmaOf } from './tolerance'
