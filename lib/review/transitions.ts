import type { Operation } from '@/lib/auth/access'
import { verdictWords, type VersionState } from './version-states'

/** Whatever moves a version from one state to another. `overtake` is nobody's act: it follows from another version. */
export const acts = ['ask', 'call-off', ...verdictWords, 'withdraw', 'overtake'] as const
export type Act = (typeof acts)[number]

/** The right each act needs; roles are in the access table. */
export const rightOf: Record<Act, Operation | null> = {
  ask: 'review.ask',
  'call-off': 'review.ask',
  approve: 'verdict.give',
  'approve-with-remarks': 'verdict.give',
  'ask-for-changes': 'verdict.give',
  comment: 'verdict.give',
  withdraw: 'version.withdraw',
  overtake: null,
}

interface Transition {
  from: readonly VersionState[]
  act: Act
  /** Null: it stays what it is. */
  to: VersionState | null
}

/**
 * What may become of a version. Asking again begins a review anew, with nobody's answers. A version in review is
 * overtaken when a later one is asked about, and every older one when a later one is approved; what is superseded or
 * withdrawn comes back only as a new version.
 */
export const transitions: readonly Transition[] = [
  { from: ['draft', 'in-review', 'changes-asked'], act: 'ask', to: 'in-review' },
  { from: ['in-review'], act: 'call-off', to: 'draft' },
  { from: ['in-review'], act: 'approve', to: 'approved' },
  { from: ['in-review'], act: 'approve-with-remarks', to: 'approved-with-remarks' },
  { from: ['in-review', 'changes-asked'], act: 'ask-for-changes', to: 'changes-asked' },
  {
    from: ['draft', 'in-review', 'changes-asked', 'approved', 'approved-with-remarks', 'superseded'],
    act: 'comment',
    to: null,
  },
  {
    from: ['draft', 'in-review', 'changes-asked', 'approved', 'approved-with-remarks', 'superseded'],
    act: 'withdraw',
    to: 'withdrawn',
  },
  {
    from: ['draft', 'in-review', 'changes-asked', 'approved', 'approved-with-remarks'],
    act: 'overtake',
    to: 'superseded',
  },
]

/** What the act makes of it, or undefined where the table does not know the act there. */
export function nextState(from: VersionState, act: Act): VersionState | undefined {
  const found = transitions.find((row) => row.act === act && row.from.includes(from))
  return found && (found.to ?? from)
}

/** Every state the act leads out of. */
export const statesBefore = (act: Act): readonly VersionState[] =>
  transitions.filter((row) => row.act === act).flatMap((row) => row.from)
