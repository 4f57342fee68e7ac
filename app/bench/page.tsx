import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { signOutAction } from '@/app/actions'
import { sceneOf } from '@/app/scene-of'
import { sheetPerson } from '@/app/sheet-person'
import { Sheet } from '@/components/shell/sheet'
import { operationsOf, presentMembership } from '@/lib/auth/access'
import { currentPerson } from '@/lib/auth/current-person'
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
  const number = /^[1-9]\d{0,8}$/.test(one('version') ?? '') ? Number(one('version')) : undefined
  const opened = person && sceneId ? await sceneOf(person, sceneId, number) : null
  const membership = person
    ? (person.memberships.find(({ workshopId }) => workshopId === opened?.scene.workshopId) ??
      presentMembership(person))
    : null
  const may = membership ? operationsOf(membership.role) : []
  const draft = person && may.includes('draft.keep') ? await readDraft(person, sceneId) : null
  return (
    <Sheet
      current="bench"
      className="bench"
      person={person && sheetPerson(person, membership?.workshopId)}
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
            head: opened.scene.headVersion,
            document: opened.version.document,
          }
        }
        asked={number !== undefined}
        draft={draft}
        preset={one('preset')}
        fresh={asked.new !== undefined}
      />
    </Sheet>
  )
}
