import Link from 'next/link'
import { signOutAction } from '@/app/actions'
import { sheetPerson } from '@/app/sheet-person'
import { LiveScene } from '@/components/drawing/live-scene'
import { Sheet } from '@/components/shell/sheet'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import { currentPerson } from '@/lib/auth/current-person'
import { newScene } from '@/scene/model/default-scene'
import { presetById } from '@/scene/model/presets'
import { summaryOf } from '@/scene/model/summary'

const shown = 'v8x-5000'

const uses = [
  [
    'Design',
    'choose layout, phasing, firing order and counterweights, and see at once what is left to shake',
  ],
  ['Show', 'send a link that opens on any phone, tablet or shop computer, graphics card or not'],
  ['Explain', 'let an owner see the part in question in the running engine'],
  ['Review', 'save numbered versions that nobody can change afterwards'],
] as const

export default async function HomePage() {
  const person = await currentPerson()
  const { train } = presetById(shown)!
  const scene = newScene(train)
  return (
    <Sheet current="none" className="home" person={person && sheetPerson(person)} signOut={signOutAction}>
      <section className="stage" aria-label="Drawing">
        <LiveScene
          scene={scene}
          poster={`/api/v1/presets/${shown}/poster.png`}
          label={train.title}
          description={summaryOf(scene).sentence}
        />
      </section>
      <section className="hello">
        <h1>A crank train, described once, running in front of everyone who decides on it</h1>
        <p className="read">
          Any cylinder count, any bank angle, any throw phasing, from exact kinematics, with its forces and
          its firing on it.
        </p>
        <dl className="uses">
          {uses.map(([name, words]) => (
            <div key={name}>
              <dt>{name}</dt>
              <dd>{words}</dd>
            </div>
          ))}
        </dl>
        <p className="caution">
          Planning figures: rigid crank, steady speed. The maker’s data, the machine shop and a qualified
          person come first.
        </p>
      </section>
      <TitleBlock>
        <TitleCell k="Running now" span={6} first top>
          <span className="v title">{train.title}</span>
        </TitleCell>
        <TitleActions>
          {person ? (
            <Link className="btn" href="/scenes">
              Scenes
            </Link>
          ) : (
            <Link className="btn" href="/sign-up">
              Open a workshop
            </Link>
          )}
          <Link className="btn pri" href="/bench">
            Open the bench
          </Link>
        </TitleActions>
      </TitleBlock>
    </Sheet>
  )
}
