import type { Person } from '@/lib/auth/access'
import type { printDesignSheet as contract } from '@/lib/contracts/design-sheets'
import type { BodyOf } from '@/lib/contracts/operation'
import { notSignedIn } from '@/lib/errors/problem'
import { designSheet, pictureBox, type DesignSheet } from '@/lib/export/design-sheet'
import { sheetContent, type SheetStamp } from '@/lib/sheet/sheet-content'
import type { Paper, SheetPart, SheetUnits } from '@/lib/sheet/sheet-parts'
import type { Scene } from '@/scene/model/scene'
import { openScene } from './open-scene'
import { printFonts } from './print-fonts'
import { printedScene } from './printed-scene'

/** Draws the engine for a place of this size in points. */
export type DrawPicture = (scene: Scene, points: { width: number; height: number }) => Promise<Uint8Array>

interface Wanted {
  paper: Paper
  units: SheetUnits
  parts: readonly SheetPart[]
}

/** The design sheet of what was sent. The saved version it names is looked up for the person who asks. */
export async function printDesignSheet(
  person: Person | null,
  body: BodyOf<typeof contract>,
  draw: DrawPicture,
): Promise<Uint8Array<ArrayBuffer>> {
  const scene = printedScene(body)
  const { of } = body
  if (!of) return print(scene, body, { title: scene.train.title }, draw)
  if (!person) throw notSignedIn()
  const { scene: saved, version } = await openScene(person, of.sceneId, of.version)
  const stamp = {
    title: saved.title,
    sceneId: saved.id,
    version: version.number,
    changed: JSON.stringify(version.document.train) !== JSON.stringify(scene.train),
  }
  return print(scene, body, stamp, draw)
}

/** The design sheet of a saved version, for somebody who may read it. */
export async function printVersion(
  person: Person,
  id: string,
  number: number,
  wanted: Wanted,
  draw: DrawPicture,
): Promise<Uint8Array<ArrayBuffer>> {
  const { scene, version } = await openScene(person, id, number)
  const stamp = { title: scene.title, sceneId: scene.id, version: version.number }
  return print(version.document, wanted, stamp, draw)
}

async function print(
  scene: Scene,
  { paper, units, parts }: Wanted,
  of: Omit<SheetStamp, 'date'>,
  draw: DrawPicture,
) {
  const date = new Date().toLocaleDateString('en-GB', {
    day: 'numeric',
    month: 'long',
    year: 'numeric',
    timeZone: 'UTC',
  })
  const content = sheetContent({ scene, units, parts, stamp: { ...of, date } })
  const picture: DesignSheet['picture'] = content.drawn
    ? Uint8Array.from(await draw(scene, pictureBox(paper)))
    : null
  return designSheet({ content, paper, picture, fonts: await printFonts() })
}
