import type { z } from 'zod'
import type { Issue } from '@/scene/model/issue'
import { shapeIssues } from '@/scene/model/shape-issues'

/** A contract's refusals of a request; paths are from its root. */
export function requestIssues(error: z.ZodError, request: unknown): Issue[] {
  const issues = shapeIssues(error, request)
  return error.issues.map((refusal, index) => {
    const issue = issues[index]
    if (refusal.code === 'custom') {
      const fix: unknown = refusal.params?.fix
      return { ...issue, message: refusal.message, fix: typeof fix === 'string' ? fix : issue.fix }
    }
    if (refusal.code === 'invalid_format' && refusal.format === 'email') {
      return {
        ...issue,
        message: 'This is not an e-mail address.',
        fix: 'Give one such as name@example.com.',
      }
    }
    return issue
  })
}
