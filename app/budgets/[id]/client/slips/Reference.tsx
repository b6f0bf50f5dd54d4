'use client'
import type { SectionName } from '../../../../../lib/budget/schema'
import { useReading } from '../state/contexts'
import { recordName } from '../words/say'

/** The name of the record that a field points to, kept up to date by itself. */
export function Reference({ section, id }: { section: SectionName; id: string }) {
  const { budget } = useReading()
  return <>{recordName(budget, section, id)}</>
}
