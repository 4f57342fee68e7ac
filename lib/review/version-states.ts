/** What a version is to those who judge it. A version nobody has done anything to is a draft. */
export const versionStates = [
  'draft',
  'in-review',
  'changes-asked',
  'approved',
  'approved-with-remarks',
  'superseded',
  'withdrawn',
] as const
export type VersionState = (typeof versionStates)[number]

export const stateWords: Record<VersionState, string> = {
  draft: 'Draft',
  'in-review': 'In review',
  'changes-asked': 'Changes asked for',
  approved: 'Approved',
  'approved-with-remarks': 'Approved with remarks',
  superseded: 'Superseded',
  withdrawn: 'Withdrawn',
}

/** A person's word on a version. */
export const verdictWords = ['approve', 'approve-with-remarks', 'ask-for-changes', 'comment'] as const
export type VerdictWord = (typeof verdictWords)[number]

/** As it was said once it has been given, on the stamp and in mails. */
export const givenWords: Record<VerdictWord, string> = {
  approve: 'Approved',
  'approve-with-remarks': 'Approved with remarks',
  'ask-for-changes': 'Changes asked for',
  comment: 'Comment',
}

export const approvals = ['approve', 'approve-with-remarks'] as const
export type Approval = (typeof approvals)[number]
export const isApproval = (word: string): word is Approval => (approvals as readonly string[]).includes(word)

/** Words that answer a review; a comment leaves it open. */
export const isDecisive = (word: VerdictWord) => word !== 'comment'

export const checklistAnswers = ['yes', 'no', 'does-not-apply'] as const
export type ChecklistAnswer = (typeof checklistAnswers)[number]

export const answerWords: Record<ChecklistAnswer, string> = {
  yes: 'Yes',
  no: 'No',
  'does-not-apply': 'Does not apply',
}
