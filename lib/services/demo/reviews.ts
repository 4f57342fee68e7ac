import type { Person } from '@/lib/auth/access'
import type { VerdictWord } from '@/lib/review/version-states'
import { answerChecklist } from '../reviews/answer-checklist'
import { askReview } from '../reviews/ask-review'
import { giveVerdict } from '../reviews/give-verdict'
import { readReview } from '../reviews/read-review'

interface DemoReview {
  scene: string
  version: number
  message: string
  /** Left out it is still open. */
  verdict?: [VerdictWord, string]
}

/** In the order in which they happened. */
const reviews: DemoReview[] = [
  {
    scene: 'twin',
    version: 2,
    message: '56 % for the builder.',
    verdict: ['approve', 'Agreed for the first mount.'],
  },
  { scene: 'twin', version: 3, message: 'The mount has changed.', verdict: ['approve', 'Agreed.'] },
  {
    scene: 'cross',
    version: 3,
    message: 'Before it goes to the customer.',
    verdict: [
      'ask-for-changes',
      'Counterweight 4D uses 98 % of what half a disc holds: a little more radius.',
    ],
  },
  {
    scene: 'cross',
    version: 4,
    message: 'Radius up by 1 mm.',
    verdict: ['approve-with-remarks', 'Good. Say in the message which counterweights moved.'],
  },
  { scene: 'flat', version: 2, message: 'Against the cross plane at the same speed.' },
]

const inAWeek = () => new Date(Date.now() + 7 * 86_400_000).toISOString().slice(0, 10)

/** Reviews as the people of the demonstration ask and answer them. What has been done already is left as it is. */
export async function demoReviews(
  designer: Person,
  judge: Person,
  places: Record<string, string>,
): Promise<void> {
  for (const { scene, version, message, verdict } of reviews) {
    const id = places[scene]
    const found = (await readReview(judge, id, version)).review
    if (found.verdicts.length > 0) continue
    const review =
      found.state === 'in-review'
        ? found
        : (await askReview(designer, id, version, { reviewers: [judge.id], due: inAWeek(), message })).review
    if (!verdict) continue
    const items = review.request?.checklist ?? []
    const answers = items.map((_, item) => ({ item, answer: 'yes' as const, words: '' }))
    await answerChecklist(judge, id, version, { answers })
    const [word, sentence] = verdict
    await giveVerdict(judge, id, version, { word, sentence })
  }
}
