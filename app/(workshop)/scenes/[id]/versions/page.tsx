import type { Metadata } from 'next'
import Link from 'next/link'
import { redirect } from 'next/navigation'
import { signOutAction } from '@/app/actions'
import { sceneOf } from '@/app/scene-of'
import { Sheet } from '@/components/shell/sheet'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import { currentPerson } from '@/lib/auth/current-person'
import { NumberedVersions } from './numbered-versions'

export const metadata: Metadata = { title: 'Versions' }

interface Props {
  params: Promise<{ id: string }>
}

export default async function VersionsPage({ params }: Props) {
  const person = await currentPerson()
  const { id } = await params
  if (!person) redirect(`/sign-in?next=${encodeURIComponent(`/scenes/${id}/versions`)}`)
  const { scene, version, may } = await sceneOf(person, id)
  const workshop = person.memberships.find(({ workshopId }) => workshopId === scene.workshopId)
  return (
    <Sheet
      current="none"
      className="versions"
      person={workshop ? { name: person.name, workshop: workshop.workshopName } : null}
      signOut={signOutAction}
    >
      <NumberedVersions sceneId={scene.id} title={scene.title} may={may} latest={version.document} />
      <TitleBlock>
        <TitleCell k="Title" span={6} first top>
          <h1 className="v title">{scene.title}</h1>
        </TitleCell>
        <TitleCell k="Latest version" span={3} first>
          <span className="v">{scene.headVersion}</span>
        </TitleCell>
        <TitleCell k="Workshop" span={3}>
          <span className="v">{workshop?.workshopName ?? ''}</span>
        </TitleCell>
        <TitleActions>
          <Link className="btn" href="/scenes">
            To the register
          </Link>
          <Link className="btn pri" href={`/bench?scene=${scene.id}`}>
            To the bench
          </Link>
        </TitleActions>
      </TitleBlock>
    </Sheet>
  )
}
