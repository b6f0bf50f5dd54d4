import type { SectionName } from '../../../../../lib/budget/schema'

/** Sections that are edited as tables under the rows. */
export type TableSection = Extract<SectionName, 'assemblies' | 'lossClasses' | 'allowances' | 'shares' | 'corners'>
