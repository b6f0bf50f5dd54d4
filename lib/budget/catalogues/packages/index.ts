export { type PackageEntry, packageEntry } from './entry'
export { lineFromPackage } from './lineFromPackage'
export { PUBLISHED_PACKAGES } from './published'
