import { describe, expect, it } from 'vitest'
import { access, holders, holds } from '@/lib/auth/access'
import { heldBy, type Ground } from '@/lib/review/held'
import { acts, nextState, rightOf, statesBefore, transitions, type Act } from '@/lib/review/transitions'
import { isApproval, versionStates, type VersionState } from '@/lib/review/version-states'

/** Written out once more by hand, so that a slip in the table shows: rows are states, columns acts. */
const expected: Record<VersionState, Partial<Record<Act, VersionState>>> = {
  draft: { ask: 'in-review', comment: 'draft', withdraw: 'withdrawn', overtake: 'superseded' },
  'in-review': {
    ask: 'in-review',
    'call-off': 'draft',
    approve: 'approved',
    'approve-with-remarks': 'approved-with-remarks',
    'ask-for-changes': 'changes-asked',
    comment: 'in-review',
    withdraw: 'withdrawn',
    overtake: 'superseded',
  },
  'changes-asked': {
    ask: 'in-review',
    'ask-for-changes': 'changes-asked',
    comment: 'changes-asked',
    withdraw: 'withdrawn',
    overtake: 'superseded',
  },
  approved: { comment: 'approved', withdraw: 'withdrawn', overtake: 'superseded' },
  'approved-with-remarks': {
    comment: 'approved-with-remarks',
    withdraw: 'withdrawn',
    overtake: 'superseded',
  },
  superseded: { comment: 'superseded', withdraw: 'withdrawn' },
  withdrawn: {},
}

const ground: Ground = {
  state: 'in-review',
  own: false,
  needsTwoPeople: false,
  openErrors: [],
  unanswered: 0,
  items: 6,
}

const cases = versionStates.flatMap((from) => acts.map((act) => ({ from, act })))

describe('transitions', () => {
  it.each(cases)('nextState($from, $act)', ({ from, act }) => {
    expect(nextState(from, act)).toBe(expected[from][act])
    expect(heldBy(act, { ...ground, state: from }) === null).toBe(act in expected[from])
  })

  it('every act has at most one row from a state, and only its way back begins with what ends', () => {
    for (const { from, act } of cases) {
      expect(transitions.filter((row) => row.act === act && row.from.includes(from)).length).toBeLessThan(2)
    }
    expect(statesBefore('overtake')).not.toContain('withdrawn')
  })

  it.each(acts.flatMap((act) => holders.map((holder) => ({ act, holder }))))(
    '$act is for $holder as the access table says',
    ({ act, holder }) => {
      const right = rightOf[act]
      if (right === null) expect(act).toBe('overtake')
      else expect(holds(holder, right)).toBe((access[right] as readonly string[]).includes(holder))
    },
  )
})

describe('heldBy()', () => {
  it.each(acts.filter((act) => nextState('in-review', act) !== undefined))(
    'heldBy(%s) lets open errors, a missing answer and one’s own version hold up approval alone',
    (act) => {
      const blocks: Partial<Ground>[] = [
        { openErrors: [2] },
        { unanswered: 1 },
        { own: true, needsTwoPeople: true },
      ]
      for (const block of blocks) expect(heldBy(act, { ...ground, ...block }) !== null).toBe(isApproval(act))
      expect(heldBy(act, { ...ground, own: true })).toBeNull()
    },
  )

  it('heldBy(approve) says by what, in words', () => {
    const words = (block: Partial<Ground>) => heldBy('approve', { ...ground, ...block })?.words
    expect(words({ openErrors: [2] })).toBe('note 2 is an open error')
    expect(words({ openErrors: [2, 5, 7] })).toBe('notes 2, 5 and 7 are open errors')
    expect(words({ unanswered: 1 })).toBe('1 of 6 on the checklist is unanswered')
    expect(words({ state: 'draft' })).toBe('nobody has asked for a review yet')
  })
})
