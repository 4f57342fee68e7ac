import { z } from 'zod'
import { roles } from '@/lib/auth/access'
import json from './people.json'

/** Everybody and everything of the demonstration is invented; the addresses lead nowhere. */
export const demo = z
  .object({
    password: z.string(),
    workshops: z.array(z.string()),
    people: z.array(
      z.object({ name: z.string(), email: z.email(), roles: z.record(z.string(), z.enum(roles)) }),
    ),
  })
  .parse(json)
