import { project } from '@/scene/frame/camera'
import { HIDDEN } from '@/scene/frame/types'
import type { Labels, LabelSheet, LabelSpec } from './labels'
import type { ForcedPicture } from './forced-picture'
import type { StageLook } from './types'

/** What is written on the drawing, in the order of who gives way to whom: picked part, firings, cylinders, banks, ends, throws. */
export function listWords({ model, rig }: ForcedPicture, look: StageLook): LabelSpec[] {
  const { cylinders, throws, banks } = model.plan.train
  const lit = rig.parts.find((part) => part.id === look.lit[0])
  return [
    { text: lit?.label ?? '', kind: 'lit' },
    ...cylinders.map(({ id }): LabelSpec => ({ text: `${id} firing`, kind: 'fire' })),
    ...cylinders.map(({ id }): LabelSpec => ({ text: id, kind: 'plain' })),
    ...banks.map(({ id }): LabelSpec => ({ text: id, kind: 'bank' })),
    { text: 'free end', kind: 'minor' },
    { text: 'drive end', kind: 'minor' },
    ...throws.map(({ id }): LabelSpec => ({ text: `throw ${id}`, kind: 'minor' })),
  ]
}

/** The sheet that words are placed on. */
export interface WordSheet extends LabelSheet {
  look: StageLook
  /** Firings would flash: they get no words. */
  steadily: boolean
}

/** Letters say something where several cylinders share a bank. */
const mostBanks = 4
const beyondLabels = 1.14

/** Puts every word where its point is on the sheet. Allocates nothing. */
export function placeWords(labels: Labels, picture: ForcedPicture, sheet: WordSheet): void {
  const { cylinders, throws, banks } = picture.model.plan.train
  const { overlays } = sheet.look
  labels.begin(sheet)
  placeLit(labels, picture, sheet)
  let next = 1
  if (overlays.firing && !sheet.steadily) placeFirings(labels, next, picture, sheet)
  next += cylinders.length
  if (overlays.labels) {
    const { anchors } = picture.rig
    for (let i = 0; i < cylinders.length; i++)
      put(labels, next + i, anchors.cylinderLabel[i], 1, picture, sheet)
    next += cylinders.length
    if (banks.length > 1 && banks.length <= mostBanks)
      for (let bank = 0; bank < banks.length; bank++) {
        const first = firstOf(cylinders, bank)
        if (first >= 0) put(labels, next + bank, anchors.cylinderLabel[first], beyondLabels, picture, sheet)
      }
    next += banks.length
    put(labels, next, anchors.freeEnd, 1, picture, sheet)
    put(labels, next + 1, anchors.driveEnd, 1, picture, sheet)
    next += 2
    for (let i = 0; i < throws.length; i++) {
      const { part, local } = anchors.throwLabel[i]
      putOn(labels, next + i, part, local[0], local[1], local[2], picture, sheet)
    }
  }
  labels.end()
}

function placeLit(labels: Labels, picture: ForcedPicture, sheet: WordSheet) {
  const { rig, visibility } = picture
  for (let part = 0; part < rig.parts.length; part++) {
    if (rig.parts[part].id !== sheet.look.lit[0] || visibility[part] === HIDDEN) continue
    const { box } = rig.meshes[rig.parts[part].mesh]
    putOn(
      labels,
      0,
      part,
      (box[0] + box[3]) / 2,
      (box[1] + box[4]) / 2,
      (box[2] + box[5]) / 2,
      picture,
      sheet,
    )
  }
}

function placeFirings(labels: Labels, from: number, picture: ForcedPicture, sheet: WordSheet) {
  const { model, markers, rig } = picture
  for (let i = 0; i < model.events.length; i++) {
    const { cylinder } = model.events[i]
    if (markers.burning[cylinder] === 0) continue
    put(labels, from + cylinder, rig.anchors.cylinderLabel[cylinder], 1, picture, sheet)
  }
}

const spot = new Float64Array(3)

/** A point of the world, moved out from the crank axis by a factor. */
function put(
  labels: Labels,
  index: number,
  at: readonly number[],
  out: number,
  { frame }: ForcedPicture,
  sheet: WordSheet,
) {
  if (project(spot, frame.viewProjection, at[0] * out, at[1] * out, at[2], sheet.width, sheet.height))
    labels.put(index, spot[0], spot[1])
}

/** A point of a part. */
function putOn(
  labels: Labels,
  index: number,
  part: number,
  x: number,
  y: number,
  z: number,
  picture: ForcedPicture,
  sheet: WordSheet,
) {
  const { pose, frame } = picture
  const at = 4 * part
  const wx = pose[at] * x - pose[at + 1] * y + pose[at + 2]
  const wy = pose[at + 1] * x + pose[at] * y + pose[at + 3]
  if (project(spot, frame.viewProjection, wx, wy, z, sheet.width, sheet.height))
    labels.put(index, spot[0], spot[1])
}

/** The cylinder of a bank that is nearest the free end. */
function firstOf(cylinders: readonly { bank: number; axial: number }[], bank: number): number {
  let first = -1
  for (let i = 0; i < cylinders.length; i++)
    if (cylinders[i].bank === bank && (first < 0 || cylinders[i].axial < cylinders[first].axial)) first = i
  return first
}
