import type { Metadata } from 'next'
import Link from 'next/link'
import { redirect } from 'next/navigation'
import { signOutAction } from '@/app/actions'
import { sheetPerson } from '@/app/sheet-person'
import { WithoutWorkshop } from '@/app/without-workshop'
import { Sheet } from '@/components/shell/sheet'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import { ReviewLists } from '@/components/verdicts/review-lists'
import { operationsOf, presentMembership } from '@/lib/auth/access'
import { currentPerson } from '@/lib/auth/current-person'

export const metadata: Metadata = { title: 'Review' }

export default async function ReviewsPage() {
  const person = await currentPerson()
  if (!person) redirect('/sign-in?next=/review')
  const membership = presentMembership(person)
  if (!membership) return <WithoutWorkshop person={person} />
  const may = operationsOf(membership.role)
  return (
    <Sheet current="review" className="reviews" person={sheetPerson(person)} signOut={signOutAction}>
      <ReviewLists workshop={membership.workshopId} judges={may.includes('verdict.give')} />
      <TitleBlock>
        <TitleCell k="Register of reviews" span={6} first top>
          <span className="v title">Review</span>
        </TitleCell>
        <TitleCell k="Workshop" span={3} first>
          <span className="v">{membership.workshopName}</span>
        </TitleCell>
        <TitleCell k="Open to you as" span={3}>
          <span className="v">{membership.role}</span>
        </TitleCell>
        <TitleActions>
          <Link className="btn" href="/scenes">
            To the scenes
          </Link>
        </TitleActions>
      </TitleBlock>
    </Sheet>
  )
}
