import type { Metadata } from 'next'
import { notFound, redirect } from 'next/navigation'
import { signOutAction } from '@/app/actions'
import { sceneOf } from '@/app/scene-of'
import { sheetPerson } from '@/app/sheet-person'
import { Sheet } from '@/components/shell/sheet'
import { currentPerson } from '@/lib/auth/current-person'
import { Review } from './review'

export const metadata: Metadata = { title: 'Review' }

interface Props {
  params: Promise<{ id: string }>
  searchParams: Promise<Record<string, string | string[] | undefined>>
}

export default async function ReviewPage({ params, searchParams }: Props) {
  const person = await currentPerson()
  const { id } = await params
  const { version, note } = await searchParams
  if (!person) redirect(`/sign-in?next=${encodeURIComponent(`/scenes/${id}/review`)}`)
  const opened = await sceneOf(person, id, numberOf(version))
  const { may } = opened
  if (!may.includes('review.read')) notFound()
  const workshop = person.memberships.find(({ workshopId }) => workshopId === opened.scene.workshopId)
  return (
    <Sheet
      current="review"
      className="review"
      person={sheetPerson(person, workshop?.workshopId)}
      signOut={signOutAction}
    >
      <Review
        opened={opened}
        workshop={workshop?.workshopName ?? ''}
        person={{ id: person.id, name: person.name }}
        note={numberOf(note) ?? null}
      />
    </Sheet>
  )
}

/** A whole number of an address, or nothing: an address that was typed wrong opens the page without it. */
function numberOf(text: string | string[] | undefined): number | undefined {
  return typeof text === 'string' && /^[1-9]\d{0,8}$/.test(text) ? Number(text) : undefined
}
