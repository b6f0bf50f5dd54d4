import type { Declaration } from './declaration'
import * as budget from './v1/budgets/[id]/declaration'
import * as edits from './v1/budgets/[id]/edits/declaration'
import * as evaluation from './v1/budgets/[id]/evaluation/declaration'
import * as evidenceFile from './v1/budgets/[id]/evidence/[sha256]/declaration'
import * as evidence from './v1/budgets/[id]/evidence/declaration'
import * as member from './v1/budgets/[id]/members/[person]/declaration'
import * as members from './v1/budgets/[id]/members/declaration'
import * as trail from './v1/budgets/[id]/trail/declaration'
import * as budgets from './v1/budgets/declaration'
import * as catalogueEntry from './v1/catalogues/[id]/declaration'
import * as catalogues from './v1/catalogues/declaration'
import * as evaluate from './v1/evaluate/declaration'
import * as example from './v1/examples/[id]/declaration'
import * as health from './v1/health/declaration'
import * as openapi from './v1/openapi.json/declaration'
import * as owner from './v1/owner/declaration'
import * as password from './v1/password/declaration'
import * as people from './v1/people/declaration'
import * as session from './v1/session/declaration'
import * as token from './v1/tokens/[id]/declaration'
import * as tokens from './v1/tokens/declaration'

/** Every operation of the API, in the order of the document. A test compares the list with the route files. */
export const OPERATIONS: readonly Declaration[] = [
  session,
  owner,
  password,
  people,
  tokens,
  token,
  evaluate,
  budgets,
  example,
  budget,
  evaluation,
  trail,
  edits,
  evidence,
  evidenceFile,
  members,
  member,
  catalogues,
  catalogueEntry,
  health,
  openapi,
].flatMap((declarations): Declaration[] => Object.values(declarations))
