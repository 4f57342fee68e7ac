import { z } from 'zod'

export const idSchema = z.uuid()
export const timeSchema = z.iso.datetime()

export const emailSchema = z.string().trim().toLowerCase().pipe(z.email().max(254))

export const issueSchema = z
  .object({ path: z.string(), code: z.string(), message: z.string(), fix: z.string() })
  .meta({ id: 'Issue' })

/** RFC 9457, with what to do about it and, where the request itself is at fault, where. */
export const problemSchema = z
  .object({
    type: z.string(),
    title: z.string(),
    status: z.int(),
    detail: z.string(),
    cure: z.string(),
    issues: z.array(issueSchema).optional(),
  })
  .loose()
  .meta({ id: 'Problem' })
export type ProblemAnswer = z.output<typeof problemSchema>

/** Where the next page begins; opaque. */
export const cursorSchema = z.string().max(500)
export const limitSchema = z.coerce.number().int().min(1).max(100).default(24)

export const themeSchema = z.enum(['light', 'dark'])
