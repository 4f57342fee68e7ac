'use client'

import { useEffect, useMemo, useState } from 'react'
import { createPortal } from 'react-dom'
import useSWR from 'swr'
import { degrees } from '@/components/drawing/clock-moves'
import type { MovingScene } from '@/components/drawing/start-scene'
import { readAddress } from '@/lib/contracts/call'
import type { listGuestNotes } from '@/lib/contracts/guest-notes'
import type { AnswerOf } from '@/lib/contracts/operation'
import { middleOfPart } from '@/scene/frame/pins'
import { sceneCameraOf } from '@/scene/frame/scene-camera'
import { viewNameOf } from '@/scene/frame/view-name'
import type { Anchor } from '@/scene/model/anchor'
import type { SceneView } from '@/scene/model/scene'
import { createPinLayer } from '@/scene/stage/pins'
import { GuestNoteDialog, GuestThread } from './guest-dialogs'
import { flagForm, kindNames, titleOf } from './note-words'
import { PartChooser } from './part-chooser'

export interface GuestNotesProps {
  /** Where the link's notes are read and made: an address of the interface, complete but for what follows `/notes`. */
  address(path: string): string
  moving: MovingScene
  version: number
  view: SceneView
  onClose(): void
}

const millimetres = (metres: number) => Math.round(metres * 1e6) / 1e3 + 0

/** What a guest may do with notes through a link: see one's own, pin another, reply. */
export default function GuestNotes({ address, moving, version, view, onClose }: GuestNotesProps) {
  const { stage, clock, rig } = moving
  const [layer] = useState(createPinLayer)
  const [anchor, setAnchor] = useState<{ anchor: Anchor; part: string } | null>(null)
  const [open, setOpen] = useState<number | null>(null)
  const { data, mutate } = useSWR<AnswerOf<typeof listGuestNotes>, Error>(address('/notes'), readAddress)
  const notes = useMemo(() => data?.notes ?? [], [data])

  useEffect(() => stage.enrich(layer.details), [stage, layer])
  useEffect(() => layer.listen(setOpen), [layer])
  useEffect(
    () =>
      layer.set(
        notes.map((note) => ({
          number: note.number,
          part: note.anchor.partId,
          point: [
            note.anchor.pointMm[0] / 1000,
            note.anchor.pointMm[1] / 1000,
            note.anchor.pointMm[2] / 1000,
          ],
          form: flagForm(note),
          on: note.number === open,
          label: `Note ${note.number}, ${kindNames[note.kind].toLowerCase()}, ${note.state}: ${titleOf({ heading: note.heading, words: note.posts[0]?.words ?? '' })}`,
        })),
      ),
    [layer, notes, open],
  )

  const pin = (partId: string, point: readonly [number, number, number] | null) => {
    const camera = layer.camera()
    const index = rig.parts.findIndex(({ id }) => id === partId)
    if (!camera || index < 0) return
    const playing = clock.playing
    clock.pause()
    const at = point ?? middleOfPart(rig, index)
    const { hidden, ghost, overlays, sectionAxialMm, speedRpm } = view
    setAnchor({
      part: rig.parts[index].label,
      anchor: {
        ...{ version, partId, playing, speedRpm, hidden, ghost, overlays, sectionAxialMm, units: 'si' },
        pointMm: [millimetres(at[0]), millimetres(at[1]), millimetres(at[2])],
        angleDeg: degrees(clock.angle),
        camera: sceneCameraOf(camera, 1e6),
        view: viewNameOf(camera, rig),
      },
    })
  }
  const chosen = notes.find(({ number }) => number === open)
  const host = document.querySelector('.live-scene > .stage-host')
  return (
    <>
      {host && !anchor
        ? createPortal(
            <div
              className="pin-paper"
              onClick={(event) => {
                const box = event.currentTarget.getBoundingClientRect()
                const met = layer.pick(event.clientX - box.left, event.clientY - box.top)
                if (met) pin(met.part, met.point)
              }}
            />,
            host,
          )
        : null}
      <div className="guest-placing">
        {notes.length > 0 ? (
          <ul className="guest-list" aria-label="Notes made through this link">
            {notes.map((note) => (
              <li key={note.number}>
                <button type="button" className="btn sm txt" onClick={() => setOpen(note.number)}>
                  Note {note.number} on {note.part}, {note.state}
                </button>
              </li>
            ))}
          </ul>
        ) : null}
        <PartChooser
          what="Leave a note"
          choices={rig.parts.filter(({ group }) => !view.hidden.includes(group))}
          onPart={(id) => pin(id, null)}
          onLight={() => {}}
          onClose={onClose}
        />
      </div>
      {anchor ? (
        <GuestNoteDialog
          address={address}
          {...anchor}
          onClose={() => setAnchor(null)}
          onMade={() => {
            setAnchor(null)
            void mutate()
          }}
        />
      ) : null}
      {chosen ? (
        <GuestThread
          address={address}
          note={chosen}
          onClose={() => setOpen(null)}
          onReplied={() => void mutate()}
        />
      ) : null}
    </>
  )
}
