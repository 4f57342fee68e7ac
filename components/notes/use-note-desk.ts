'use client'

import { useEffect, useEffectEvent, useMemo, useRef, useState } from 'react'
import { degrees, radians } from '@/components/drawing/clock-moves'
import type { Drawing } from '@/components/drawing/use-drawing'
import type { Operation } from '@/lib/auth/access'
import type { Note, NoteSummary } from '@/lib/contracts/notes'
import { middleOfPart } from '@/scene/frame/pins'
import { cameraOf, sceneCameraOf } from '@/scene/frame/scene-camera'
import { viewNameOf } from '@/scene/frame/view-name'
import type { Anchor } from '@/scene/model/anchor'
import type { StillDrawing } from '@/scene/model/still-drawing'
import { createPinLayer, type Pin, type PinLayer } from '@/scene/stage/pins'
import type { Stage } from '@/scene/stage/types'
import { flagForm, kindNames, titleOf } from './note-words'
import {
  everyNote,
  useNote,
  useNoteActions,
  useNoteList,
  type NoteActions,
  type NoteChoice,
} from './use-notes'
import { refusalWords } from './refusal-words'
import type { Sketch } from './sketch'

/** What pointer and keys are for at the moment: reading, choosing where a pin goes, or writing what it says. */
export type DeskMode =
  | { at: 'reading' }
  /** `move` is the note that is pinned again; none makes a new one. */
  | { at: 'placing'; move: Note | null }
  | { at: 'writing'; anchor: Anchor; part: string }

/** Everything that list, thread, pins, flags and the drawing on the still picture share on a review page. */
export interface NoteDesk {
  sceneId: string
  workshopId: string
  version: number
  headVersion: number
  may: readonly Operation[]
  drawing: Drawing
  layer: PinLayer
  choice: NoteChoice
  choose(choice: NoteChoice): void
  list: ReturnType<typeof useNoteList>
  open: Note | null
  openNumber: number | null
  openError: Error | undefined
  openNote(number: number | null): void
  step(by: 1 | -1): void
  /** To a note's angle, camera and layers; without a number it is one that is being written. */
  goTo(note: Pick<Note, 'anchor'> & { number?: number }): void
  /** The eye has moved: what is drawn over the picture lies there no more. */
  leaveView(): void
  mode: DeskMode
  setMode(mode: DeskMode): void
  /** Pins at a point of a part, in its own coordinates, m; null takes the part's middle. */
  pinAt(partId: string, point: readonly [number, number, number] | null): Promise<void>
  placeRefused: string | null
  /** Parts that are lit for the sake of notes. */
  lit: string[]
  light(part: string | null): void
  sketch: Sketch | null
  setSketch(sketch: Sketch | null): void
  /** What is drawn over the picture now: the open note's, at its view. */
  seen: StillDrawing[]
  actions: NoteActions
}

interface Props {
  sceneId: string
  workshopId: string
  headVersion: number
  version: number
  may: readonly Operation[]
  drawing: Drawing
  stage: Stage | null
  /** The note that the address opens. */
  first: number | null
}

const millimetres = (metres: number) => Math.round(metres * 1e6) / 1e3 + 0

export function useNoteDesk(props: Props): NoteDesk {
  const { sceneId, workshopId, version, headVersion, may, drawing, stage, first } = props
  const { clock, model, shown, scene } = drawing
  const [choice, choose] = useState<NoteChoice>({ ...everyNote, state: first === null ? 'open' : 'all' })
  const [openNumber, setOpenNumber] = useState(first)
  const [mode, setMode] = useState<DeskMode>({ at: 'reading' })
  const [pointed, setPointed] = useState<string | null>(null)
  const [sketch, setSketch] = useState<Sketch | null>(null)
  const [placeRefused, setPlaceRefused] = useState<string | null>(null)
  /** The note at whose view the drawing stands. */
  const [viewed, setViewed] = useState<number | null>(null)
  const list = useNoteList(sceneId, version, choice)
  const { note: open, error: openError } = useNote(sceneId, version, openNumber)
  const actions = useNoteActions(sceneId, version, list.refresh)
  const openNote = (number: number | null) => {
    setOpenNumber(number)
    setMode({ at: 'reading' })
    setSketch(null)
    if (number !== viewed) setViewed(null)
  }

  const onPin = useEffectEvent((number: number) => openNote(number))
  const [layer] = useState(createPinLayer)
  useEffect(() => layer.listen((number) => onPin(number)), [layer])

  const { notes } = list
  const pins = useMemo(() => pinsOf(notes, openNumber), [notes, openNumber])
  useEffect(() => layer.set(pins), [layer, pins])

  // whoever turns the crank has left the note's view
  const leave = useEffectEvent(() => {
    if (viewed === null || !open) return
    if (Math.abs(degrees(clock.angle) - open.anchor.angleDeg) > 0.05) setViewed(null)
  })
  useEffect(() => clock.subscribe(() => leave()), [clock])

  const goTo: NoteDesk['goTo'] = ({ anchor, number = null }) => {
    clock.pause()
    clock.setAngle(radians(anchor.angleDeg))
    const { hidden, ghost, overlays, sectionAxialMm, units } = anchor
    drawing.setShown({ hidden, ghost, overlays, sectionAxialMm, system: units })
    stage?.setCamera(cameraOf(anchor.camera))
    setViewed(number)
  }

  const goFirst = useEffectEvent((note: Note) => goTo(note))
  const been = useRef(false)
  useEffect(() => {
    if (been.current || !stage || !open || open.number !== first) return
    been.current = true
    goFirst(open)
  }, [stage, open, first])

  const pinAt = async (partId: string, point: readonly [number, number, number] | null) => {
    const camera = layer.camera()
    if (!camera) return
    setPlaceRefused(null)
    const playing = clock.playing
    clock.pause()
    const index = model.rig.parts.findIndex(({ id }) => id === partId)
    const at =
      point ??
      (index < 0 ? ([0, 0, model.plan.train.referenceAxial] as const) : middleOfPart(model.rig, index))
    const { system, ...looks } = shown
    const anchor: Anchor = {
      ...{ version, partId, playing, units: system, ...looks },
      pointMm: [millimetres(at[0]), millimetres(at[1]), millimetres(at[2])],
      angleDeg: degrees(clock.angle),
      speedRpm: scene.view.speedRpm,
      camera: sceneCameraOf(camera, 1e6),
      view: viewNameOf(camera, model.rig),
    }
    const move = mode.at === 'placing' ? mode.move : null
    if (move) {
      try {
        await actions.move(move.number, { revision: move.revision, anchor })
        setMode({ at: 'reading' })
      } catch (error) {
        setPlaceRefused(refusalWords(error))
      }
      return
    }
    setMode({ at: 'writing', anchor, part: model.rig.parts[index]?.label ?? 'Shaking force' })
  }

  const step = (by: 1 | -1) => {
    if (notes.length === 0) return
    const at = notes.findIndex(({ number }) => number === openNumber)
    const next = at < 0 ? (by > 0 ? 0 : notes.length - 1) : (at + by + notes.length) % notes.length
    openNote(notes[next].number)
  }

  const lit = useMemo(
    () =>
      [pointed, mode.at === 'writing' ? mode.anchor.partId : (open?.anchor.partId ?? null)].flatMap(
        (id) => id ?? [],
      ),
    [pointed, mode, open],
  )
  const seen = useMemo(
    () => (open && viewed === open.number ? open.posts.flatMap((post) => post.drawing ?? []) : []),
    [open, viewed],
  )

  return {
    ...{ sceneId, workshopId, version, headVersion, may, drawing, layer, choice, choose, list },
    ...{ open, openNumber, openError, openNote, step, goTo, mode, setMode, pinAt, placeRefused },
    leaveView: () => setViewed(null),
    ...{ lit, light: setPointed, sketch, setSketch, seen, actions },
  }
}

/** Those that get flags where there is not room for all stand first: the open one, errors, then whatever else is open. */
function pinsOf(notes: readonly NoteSummary[], on: number | null): Pin[] {
  const rank = ({ number, kind, state }: NoteSummary) =>
    number === on ? 0 : state === 'settled' ? 3 : kind === 'error' ? 1 : 2
  return [...notes]
    .filter(({ standing }) => standing !== 'gone')
    .sort((a, b) => rank(a) - rank(b) || a.number - b.number)
    .map((note) => ({
      number: note.number,
      part: note.anchor.partId,
      point: [note.anchor.pointMm[0] / 1000, note.anchor.pointMm[1] / 1000, note.anchor.pointMm[2] / 1000],
      form: flagForm(note),
      on: note.number === on,
      label: `Note ${note.number}, ${kindNames[note.kind].toLowerCase()}, ${note.state}: ${titleOf(note)}`,
    }))
}
