import type { Answer } from './callApi'

/**
 * Puts a problem that concerns one field beside it.
 * @param fieldOf code of the API's problem → name of the field in the form
 */
export function beside(answer: Answer, fieldOf: Readonly<Record<string, string>>): Answer {
  if (answer.ok) return answer
  const { code, sentence, fields } = answer.problem
  const field = fieldOf[code]
  if (field === undefined) return answer
  return {
    ok: false,
    problem: {
      code,
      sentence: 'Nothing was changed; what to do stands beside the field.',
      fields: { ...fields, [field]: sentence },
    },
  }
}
