import { SECTIONS, type SectionName } from '../../../lib/budget/schema'

export const sections = Object.keys(SECTIONS) as [SectionName, ...SectionName[]]
