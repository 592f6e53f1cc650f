import type { ZodError } from 'zod'
import type { Issue } from '#shared/errors'

/** zod's findings in our codes: which field, why, and what its sentence names. Own refinements carry their code as the message. */
export function issuesOf(error: ZodError, base: string): Issue[] {
  return error.issues.map((issue): Issue => {
    const path = [base, ...issue.path.map(String)].filter(part => part !== '').join('.')
    switch (issue.code) {
      case 'invalid_type': return issue.input === undefined ? { path, code: 'required' } : { path, code: 'wrong-type', params: { expected: String(issue.expected) } }
      case 'too_small': return issue.origin === 'string' && Number(issue.minimum) <= 1 ? { path, code: 'required' } : { path, code: 'too-small', params: { minimum: String(issue.minimum) } }
      case 'too_big': return { path, code: issue.origin === 'string' ? 'too-long' : 'too-big', params: { maximum: String(issue.maximum) } }
      case 'invalid_value': return { path, code: 'not-one-of', params: { values: issue.values.slice(0, 12).map(String).join(', ') } }
      case 'unrecognized_keys': return { path, code: 'unknown-field', params: { fields: issue.keys.join(', ') } }
      case 'invalid_format': return { path, code: 'wrong-form', params: { form: issue.format } }
      case 'custom': return { path, code: issue.message }
      default: return { path, code: 'wrong-form', params: { form: issue.code } }
    }
  })
}
