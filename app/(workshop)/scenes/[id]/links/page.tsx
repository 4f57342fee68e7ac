import type { Metadata } from 'next'
import { notFound, redirect } from 'next/navigation'
import { signOutAction } from '@/app/actions'
import { sceneOf } from '@/app/scene-of'
import { LinkRegister } from '@/components/sharing/link-register'
import { Sheet } from '@/components/shell/sheet'
import { operationsOf, roleIn } from '@/lib/auth/access'
import { currentPerson } from '@/lib/auth/current-person'

export const metadata: Metadata = { title: 'Share links' }

export default async function LinksPage({ params, searchParams }: PageProps<'/scenes/[id]/links'>) {
  const person = await currentPerson()
  const { id } = await params
  const { link } = await searchParams
  if (!person) redirect(`/sign-in?next=${encodeURIComponent(`/scenes/${id}/links`)}`)
  const { scene } = await sceneOf(person, id)
  const role = roleIn(person, scene.workshopId)
  const may = role ? operationsOf(role) : []
  if (!may.includes('link.list')) notFound()
  const workshop =
    person.memberships.find(({ workshopId }) => workshopId === scene.workshopId)?.workshopName ?? ''
  return (
    <Sheet current="none" className="links" person={{ name: person.name, workshop }} signOut={signOutAction}>
      <LinkRegister
        {...{ workshop, may }}
        sceneId={scene.id}
        title={scene.title}
        headVersion={scene.headVersion}
        first={typeof link === 'string' ? link : null}
      />
    </Sheet>
  )
}
