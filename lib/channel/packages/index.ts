export { type PackageLine, packageAttenuation, packageTwoPort } from './packageLine'
