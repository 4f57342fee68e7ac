import type { VerdictWord } from '@/lib/review/version-states'

export const verdictLabels: Record<VerdictWord, string> = {
  approve: 'Approve',
  'approve-with-remarks': 'Approve with remarks',
  'ask-for-changes': 'Ask for changes',
  comment: 'Comment',
}
