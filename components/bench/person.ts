import type { Operation } from '@/lib/auth/access'

/** Who is at the bench, as far as the page needs to know. */
export interface BenchPerson {
  name: string
  workshop: string
  workshopId: string
  /** What their role may do. */
  may: readonly Operation[]
}
