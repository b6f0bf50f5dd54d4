import type { Budget, SectionName } from '../../../../../lib/budget/schema'
import { metaOf } from '../../../../../lib/sheet/layout'
import { inOrder } from '../deeds/records'
import { wordOf } from '../words/choices'
import { recordName } from '../words/say'

export type Option = { readonly value: string; readonly label: string }

/**
 * What a choice field may be: the codes of its list, or the records that it may point to. A record that was taken out
 * stays among them as long as the field points to it.
 */
export function optionsOf(
  budget: Budget,
  section: 'head' | SectionName,
  field: string,
  now: string,
): readonly Option[] {
  const meta = metaOf(section, field)
  const empty: Option = { value: '', label: '–' }
  switch (meta?.kind) {
    case 'choice':
      return [empty, ...meta.choices.map((code) => ({ value: code, label: wordOf(code) }))]
    case 'flag':
      return [empty, { value: 'yes', label: 'yes' }, { value: 'no', label: 'no' }]
    case 'reference': {
      const target = meta.section as SectionName
      const options = inOrder<{ order: string; removed: boolean }>(budget[target]).map(([id]) => ({
        value: id,
        label: recordName(budget, target, id),
      }))
      const gone = now !== '' && !options.some(({ value }) => value === now)
      const kept = gone ? [{ value: now, label: `${recordName(budget, target, now)} (taken out)` }] : []
      return [empty, ...options, ...kept]
    }
    default:
      return []
  }
}
