import { z } from 'zod'
import { timeSchema } from './common'
import { operation } from './operation'

export const health = operation({
  id: 'health',
  method: 'GET',
  path: '/api/v1/health',
  summary: 'Whether the database answers and its migrations are current',
  for: 'anyone',
  limit: 'reading',
  status: 200,
  answer: z.object({ status: z.literal('ready'), migration: z.string() }),
  problems: { 503: 'The database does not answer, or is behind' },
})

export const description = operation({
  id: 'description',
  method: 'GET',
  path: '/api/v1/openapi.json',
  summary: 'This description, in OpenAPI 3.1',
  for: 'anyone',
  limit: 'reading',
  status: 200,
  answer: z.looseObject({ openapi: z.string() }),
})

export const mailSchema = z.object({
  id: z.string(),
  to: z.string(),
  subject: z.string(),
  text: z.string(),
  html: z.string(),
  headers: z.record(z.string(), z.string()),
  sentAt: timeSchema,
})

export const localMail = operation({
  id: 'localMail',
  method: 'GET',
  path: '/api/v1/local/mail',
  summary: 'Mails kept on this machine instead of being sent, newest first; only there',
  for: 'anyone',
  limit: 'reading',
  status: 200,
  answer: z.object({ mails: z.array(mailSchema) }),
  problems: { 404: 'Mail is not kept here' },
})

export const systemOperations = [health, description, localMail]
