import type { Metadata } from 'next'
import { notFound, redirect } from 'next/navigation'
import { signOutAction } from '@/app/actions'
import { Sheet } from '@/components/shell/sheet'
import { operationsOf, type Person } from '@/lib/auth/access'
import { currentPerson } from '@/lib/auth/current-person'
import { Problem } from '@/lib/errors/problem'
import { openScene } from '@/lib/services/open-scene'
import { readDraft } from '@/lib/services/read-draft'
import { BenchWithLeaves } from './leaves'

export const metadata: Metadata = { title: 'Bench' }

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>
}

export default async function BenchPage({ searchParams }: Props) {
  const person = await currentPerson()
  const asked = await searchParams
  const one = (name: string) => (typeof asked[name] === 'string' ? asked[name] : null)
  const sceneId = one('scene')
  if (sceneId && !person) redirect(`/sign-in?next=${encodeURIComponent(`/bench?scene=${sceneId}`)}`)
  const opened = person && sceneId ? await sceneOf(person, sceneId) : null
  const membership = person
    ? (person.memberships.find(({ workshopId }) => workshopId === opened?.scene.workshopId) ??
      person.memberships[0])
    : null
  const may = membership ? operationsOf(membership.role) : []
  const draft = person && may.includes('draft.keep') ? await readDraft(person, sceneId) : null
  return (
    <Sheet
      current="bench"
      className="bench"
      person={person && membership && { name: person.name, workshop: membership.workshopName }}
      signOut={signOutAction}
    >
      <BenchWithLeaves
        person={
          person &&
          membership && {
            name: person.name,
            workshop: membership.workshopName,
            workshopId: membership.workshopId,
            may,
          }
        }
        opened={
          opened && {
            sceneId: opened.scene.id,
            version: opened.version.number,
            document: opened.version.document,
          }
        }
        draft={draft}
        preset={one('preset')}
        fresh={asked.new !== undefined}
      />
    </Sheet>
  )
}

/** A scene that is not there and one that is somebody else's look alike. */
async function sceneOf(person: Person, id: string) {
  try {
    return await openScene(person, id)
  } catch (error) {
    if (error instanceof Problem && (error.kind === 'not-found' || error.kind === 'not-allowed')) notFound()
    throw error
  }
}
