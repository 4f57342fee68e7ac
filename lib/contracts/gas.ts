import { z } from 'zod'
import { operation } from './operation'

export const traceSchema = z
  .object({
    /** From firing top dead centre, rising from −360 (two-stroke −180) over one whole cycle. */
    angleDeg: z.array(z.number()),
    /** Absolute. */
    pressureBar: z.array(z.number()),
    /** How the file was understood, where it does not say so itself. */
    understood: z.array(z.string()),
  })
  .meta({ id: 'PressureTrace' })
export type TraceAnswer = z.output<typeof traceSchema>

export const readTrace = operation({
  id: 'readTrace',
  method: 'POST',
  path: '/api/v1/traces',
  summary:
    'A measured pressure trace from its CSV file, whose header names the units, as the gas model of a train',
  for: 'anyone',
  limit: 'analyses',
  body: z.object({ cycle: z.enum(['four-stroke', 'two-stroke']), csv: z.string().min(1) }),
  status: 200,
  answer: traceSchema,
})
