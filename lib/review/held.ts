import { nextState, type Act } from './transitions'
import { isApproval, type VersionState } from './version-states'

/** What is known of a version when somebody is about to act on it. */
export interface Ground {
  state: VersionState
  /** It was saved by whoever acts. */
  own: boolean
  /** The workshop wants approval by somebody else than the author. */
  needsTwoPeople: boolean
  /** Numbers of the open notes that are errors. */
  openErrors: readonly number[]
  /** Of the checklist, by whoever acts. */
  unanswered: number
  items: number
}

export interface Held {
  code: 'state' | 'own-version' | 'open-errors' | 'unanswered'
  /** Follows "held:". */
  words: string
}

const standing: Record<VersionState, string> = {
  draft: 'nobody has asked for a review yet',
  'in-review': 'it is in review',
  'changes-asked': 'changes were asked for, the review has to be asked for again',
  approved: 'it is approved already',
  'approved-with-remarks': 'it is approved already',
  superseded: 'a later version has taken its place',
  withdrawn: 'this version is withdrawn',
}

const listed = (numbers: readonly number[]) =>
  numbers.length === 1
    ? `note ${numbers[0]} is an open error`
    : `notes ${numbers.slice(0, -1).join(', ')} and ${numbers[numbers.length - 1]} are open errors`

/** Why an act cannot be done now, or null. Whether somebody may do it at all is the access table's business. */
export function heldBy(act: Act, ground: Ground): Held | null {
  if (nextState(ground.state, act) === undefined) return { code: 'state', words: standing[ground.state] }
  if (!isApproval(act)) return null
  if (ground.needsTwoPeople && ground.own) {
    return { code: 'own-version', words: 'the version is yours, and somebody else has to approve it' }
  }
  if (ground.openErrors.length > 0) return { code: 'open-errors', words: listed(ground.openErrors) }
  if (ground.unanswered > 0) {
    const verb = ground.unanswered === 1 ? 'is' : 'are'
    return {
      code: 'unanswered',
      words: `${ground.unanswered} of ${ground.items} on the checklist ${verb} unanswered`,
    }
  }
  return null
}
