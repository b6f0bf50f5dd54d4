import type { z } from 'zod'
import { crossCheck } from './crossCheck'
import { fieldWords, nameOf } from './record'
import { type Budget, budgetSchema, LANE_KEY, SCHEMA_VERSION, SECTIONS, type SectionName } from './schema'

export type BudgetIssue = {
  /** Where it is, such as 'lines.l3.loss'; '' is the whole file. */
  readonly path: string
  /** A sentence that names the record and the field and says what to do. */
  readonly message: string
}

/** More than this helps nobody. */
const MOST_ISSUES = 50

/** Reads a budget from JSON that somebody handed in. @returns the budget, or what is wrong with it; never throws. */
export function parseBudget(json: unknown): { readonly budget: Budget } | { readonly issues: readonly BudgetIssue[] } {
  const version = versionIssue(json)
  if (version) return { issues: [version] }
  const result = budgetSchema.safeParse(json)
  if (!result.success) return { issues: result.error.issues.slice(0, MOST_ISSUES).map((issue) => worded(issue, json)) }
  const refused = crossCheck(result.data)
  return refused === null ? { budget: result.data } : { issues: [{ path: '', message: refused }] }
}

/** What keeps JSON from being a budget; empty where nothing does. */
export function budgetIssues(json: unknown): readonly BudgetIssue[] {
  const result = parseBudget(json)
  return 'issues' in result ? result.issues : []
}

function versionIssue(json: unknown): BudgetIssue | null {
  const version = member(member(json, 'head'), 'schemaVersion')
  if (version === SCHEMA_VERSION) return null
  const path = 'head.schemaVersion'
  if (typeof version === 'number' && version > SCHEMA_VERSION) {
    return {
      path,
      message: `This budget was written by a newer version (schema ${version}, this one reads ${SCHEMA_VERSION}); update first.`,
    }
  }
  return { path, message: `This is no budget file: "head" must say "schemaVersion": ${SCHEMA_VERSION}.` }
}

function worded(issue: z.core.$ZodIssue, json: unknown): BudgetIssue {
  const path = issue.path.map(String)
  return { path: path.join('.'), message: [subjectOf(path, json), whatToDo(issue, path)].filter(Boolean).join(': ') }
}

/** The record by its name and the field by what it is. */
function subjectOf([section, second, third]: readonly string[], json: unknown): string {
  if (section === undefined) return ''
  if (section === 'head') return second === undefined ? 'The head' : `The link, ${fieldWords('head', second)}`
  if (section === 'laneValues') return second === undefined ? `'${section}'` : laneSubject(second, json)
  if (!Object.hasOwn(SECTIONS, section) || second === undefined) return `'${section}'`
  const known = section as SectionName
  const record = `${capital(nameOf(known, second, recordIn(json, section, second)))} (${section}.${second})`
  return third === undefined ? record : `${record}, ${fieldWords(known, third)}`
}

function laneSubject(key: string, json: unknown): string {
  const [, line, lane, field] = LANE_KEY.exec(key) ?? []
  if (!line || !field) return `Lane value '${key}'`
  return `${capital(nameOf('lines', line, recordIn(json, 'lines', line)))} (lines.${line}), lane ${lane}, ${fieldWords('lines', field)}`
}

function whatToDo(issue: z.core.$ZodIssue, path: readonly string[]): string {
  if (issue.code === 'unrecognized_keys') return unknownFields(issue.keys)
  if (issue.code !== 'invalid_type' || path.length > 2 || (path[0] === 'head' && path.length > 1)) return issue.message
  const records = path.length === 1 && path[0] !== 'head'
  return records
    ? 'Write the records by their ids, between { and }.'
    : 'Write the fields by their names, between { and }.'
}

function unknownFields(keys: readonly string[]): string {
  const named = keys.map((key) => `'${key}'`).join(', ')
  return keys.length === 1
    ? `${named} is not a field here; take it out or correct its name.`
    : `${named} are not fields here; take them out or correct their names.`
}

function recordIn(json: unknown, section: string, id: string): object | null {
  const record = member(member(json, section), id)
  return typeof record === 'object' ? record : null
}

function member(value: unknown, key: string): unknown {
  return typeof value === 'object' && value !== null && Object.hasOwn(value, key)
    ? (value as Record<string, unknown>)[key]
    : undefined
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1)
}
