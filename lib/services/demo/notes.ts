import type { Person } from '@/lib/auth/access'
import type { NoteKind, Settlement } from '@/lib/contracts/notes'
import { pinnables } from '@/scene/frame/anchor-issues'
import { buildRig } from '@/scene/frame/build-rig'
import { namedCamera } from '@/scene/frame/camera'
import { sceneCameraOf } from '@/scene/frame/scene-camera'
import type { Anchor } from '@/scene/model/anchor'
import type { Scene } from '@/scene/model/scene'
import { toTrain } from '@/scene/model/to-train'
import { listNotes } from '../notes/list-notes'
import { makeGuestNote } from '../notes/guest-notes'
import { makeNote } from '../notes/make-note'
import { replyToNote } from '../notes/reply-to-note'
import { settleNote } from '../notes/settle-note'
import { demoScenes } from './scenes'

type Place = keyof typeof demoScenes

interface DemoNote {
  scene: Place
  version: number
  partId: string
  angleDeg: number
  kind: NoteKind
  heading: string
  words: string
  reply?: string
  settled?: Settlement
}

const notes: DemoNote[] = [
  {
    ...{ scene: 'cross', version: 3, partId: 'counterweight:4D', angleDeg: 90, kind: 'error' },
    heading: 'Counterweight 4, drive side: at its limit',
    words: 'Moment 98 % of half-disc capacity. @Ysolde Karrowby, is there room for more radius?',
    reply: 'Version 4 has every counterweight 1 mm further out: capacity up by 3.4 %.',
    settled: { reason: 'fixed', version: 4 },
  },
  {
    ...{ scene: 'cross', version: 4, partId: 'crank-pin:3', angleDeg: 270, kind: 'remark' },
    heading: 'Say which counterweights moved',
    words: 'The message of the version could name them: all eight.',
  },
  {
    ...{ scene: 'flat', version: 2, partId: 'vector:total-force', angleDeg: 45, kind: 'error' },
    heading: 'Speed of the comparison',
    words: 'The second order is compared at 7,000 rpm, and this sheet does not say so. It has to.',
  },
]

/** In the middle of a part of a saved scene, the whole engine in view. */
function anchorOn({ train, view }: Scene, version: number, partId: string, angleDeg: number): Anchor {
  const rig = buildRig(train, toTrain(train))
  const part = pinnables(rig).find(({ id }) => id === partId)
  if (!part) throw new Error(`There is no part ${partId}.`)
  const middle = (axis: number) => (part.boxMm[axis] + part.boxMm[axis + 3]) / 2
  const { speedRpm, hidden, ghost, overlays, sectionAxialMm } = view
  return {
    ...{ version, partId, angleDeg, speedRpm, hidden, ghost, overlays, sectionAxialMm },
    pointMm: [middle(0), middle(1), middle(2)],
    playing: false,
    camera: sceneCameraOf(namedCamera('free', rig, 1.6)),
    view: 'free',
    units: 'si',
  }
}

/** Notes as a reviewer makes them and a designer answers. What has been done already is left as it is. */
export async function demoNotes(
  designer: Person,
  judge: Person,
  places: Record<string, string>,
): Promise<void> {
  for (const { scene, version, partId, angleDeg, reply, settled, ...says } of notes) {
    const id = places[scene]
    const there = await listNotes(judge, id, { limit: 200 })
    const known = there.notes.find(({ heading }) => heading === says.heading)
    const note =
      known ??
      (await makeNote(judge, id, {
        ...says,
        anchor: anchorOn(demoScenes[scene].versions[version - 1].document, version, partId, angleDeg),
        mentions: says.words.includes(`@${designer.name}`) ? [designer.id] : [],
        drawing: null,
      }))
    if (reply && note.replies === 0) {
      await replyToNote(designer, id, note.number, { words: reply, mentions: [], drawing: null })
    }
    if (settled && note.state === 'open') {
      await settleNote(judge, id, note.number, { settlement: settled, words: '' })
    }
  }
}

/** What Delphine leaves behind at the link she was sent. */
export async function demoGuestNote(token: string): Promise<void> {
  const { versions } = demoScenes.cross
  await makeGuestNote(
    { token, pass: null },
    {
      name: 'Delphine Astercroft',
      anchor: anchorOn(versions[versions.length - 1].document, versions.length, 'piston:8', 90),
      kind: 'remark',
      heading: '',
      words: 'This is the piston that was scored. Good to see it run.',
      drawing: null,
    },
  )
}
