import type { Role } from '@/lib/auth/access'

export interface OwnWorkshop {
  id: string
  name: string
  role: Role
  /** Roles that a token may have: within one's own. */
  mayGive: Role[]
}
