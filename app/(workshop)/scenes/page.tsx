import type { Metadata } from 'next'
import Link from 'next/link'
import { redirect } from 'next/navigation'
import { signOutAction } from '@/app/actions'
import { sheetPerson } from '@/app/sheet-person'
import { WithoutWorkshop } from '@/app/without-workshop'
import { SceneRegister } from '@/components/scenes/scene-register'
import { Stencil } from '@/components/scenes/stencil'
import { Sheet } from '@/components/shell/sheet'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import { operationsOf, presentMembership } from '@/lib/auth/access'
import { currentPerson } from '@/lib/auth/current-person'
import { presets } from '@/scene/model/presets'

export const metadata: Metadata = { title: 'Scenes' }

export default async function ScenesPage() {
  const person = await currentPerson()
  if (!person) redirect('/sign-in?next=/scenes')
  const membership = presentMembership(person)
  if (!membership) return <WithoutWorkshop person={person} />
  return (
    <Sheet current="scenes" className="scenes" person={sheetPerson(person)} signOut={signOutAction}>
      <SceneRegister workshop={membership.workshopId} may={operationsOf(membership.role)} />
      <Stencil layouts={presets} />
      <TitleBlock>
        <TitleCell k="Drawing register" span={6} first top>
          <span className="v title">Scenes</span>
        </TitleCell>
        <TitleCell k="Workshop" span={3} first>
          <span className="v">{membership.workshopName}</span>
        </TitleCell>
        <TitleCell k="Open to you as" span={3}>
          <span className="v">{membership.role}</span>
        </TitleCell>
        <TitleActions>
          <Link className="btn pri" href="/bench?new">
            New scene
          </Link>
        </TitleActions>
      </TitleBlock>
    </Sheet>
  )
}
