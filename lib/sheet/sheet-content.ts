import { analyse, type Analysis } from '@/lib/mechanics/analysis'
import { method, methodLimits } from '@/lib/mechanics/method'
import type { Train } from '@/lib/mechanics/train'
import { quantityText } from '@/lib/units/format'
import { toSi } from '@/lib/units/units'
import type { Scene } from '@/scene/model/scene'
import { layoutInWords } from '@/scene/model/summary'
import { toTrain } from '@/scene/model/to-train'
import { completeness, type Asked } from './completeness'
import { crankStar } from './crank-star'
import type { SheetTable } from './figure-table'
import { firingDrawing } from './firing-drawing'
import type { Drawing } from './marks'
import { printCautions } from './print-cautions'
import type { SheetPart, SheetUnits } from './sheet-parts'
import * as tables from './sheet-tables'

export interface SheetStamp {
  title: string
  /** Where it is a saved scene. */
  sceneId?: string
  version?: number
  /** The document is not the one of that version any more. */
  changed?: boolean
  workshop?: string
  /** As it is printed: 1 December 2026. */
  date: string
}

export interface SheetRequest {
  scene: Scene
  units: SheetUnits
  parts: readonly SheetPart[]
  stamp: SheetStamp
}

/** Everything on the design sheet but its layout: the same for the preview and the print. */
export interface SheetContent {
  stamp: SheetStamp
  sentence: string
  star: Drawing
  strip: Drawing
  /** Words for whoever does not see the picture of the engine. */
  pictureWords: string
  groups: { title: string; tables: SheetTable[] }[]
  completeness: Asked[] | null
  assumptions: string[]
  cautions: string[]
  method: string
  drawn: boolean
  condition: string
}

/** The firing strip is set out at this width and scaled to its place. */
const STRIP_WIDTH = 760

export function sheetContent({ scene, units, parts, stamp }: SheetRequest): SheetContent {
  const { train: document, view } = scene
  const train = toTrain(document)
  const speed = toSi(view.speedRpm, 'rpm')
  const analysis = analyse(train, { speed }) as Required<Analysis>
  const printed = { document, train, analysis, speed, units }
  const layout = layoutInWords(document)
  const has = (part: SheetPart) => parts.includes(part)
  const group = (part: SheetPart, title: string, found: () => SheetTable[]) =>
    has(part) ? [{ title, tables: found() }] : []
  const events = analysis.firing.events.map(({ cylinder, angleDeg }) => ({ id: cylinder, at: angleDeg }))
  return {
    stamp,
    sentence: `${layout}, ${quantityText(analysis.train.displacementCc / 1e6, 'volume', 'si')}`,
    star: crankStar(document),
    strip: firingDrawing({
      train: document,
      events,
      cycleDeg: document.cycle === 'two-stroke' ? 360 : 720,
      width: STRIP_WIDTH,
    }),
    pictureWords: `${document.title}: ${layout.toLowerCase()}, drawn at crank angle ${quantityText(toSi(view.angleDeg, '°'), 'angle', 'si')}.`,
    groups: [
      ...group('data', 'Main data and masses', () => [
        ...tables.mainData(printed),
        ...tables.massTable(printed),
      ]),
      ...group('balance', 'Balance', () => tables.orderTables(printed)),
      ...group('counterweights', 'Counterweights and bob-weights', () => [
        ...tables.counterweightTables(printed),
        ...tables.bobWeightTables(printed),
      ]),
      ...group('loads', 'Loads', () => tables.loadTables(printed)),
    ],
    completeness: has('completeness') ? completeness(printed) : null,
    assumptions: [
      methodLimits,
      ...rodWords(train, printed.analysis),
      ...analysis.cautions.map(({ message }) => message),
    ],
    cautions: [...printCautions],
    method: `${method.name}, version ${method.version}`,
    drawn: has('drawing'),
    condition: `Crank angle ${quantityText(toSi(view.angleDeg, '°'), 'angle', 'si')}, ${tables.atSpeed(speed)}`,
  }
}

/** What two masses instead of the rod's own inertia would miss, where it is known. */
function rodWords({ cylinders }: Train, { loads }: Required<Analysis>): string[] {
  const rigid = cylinders.filter(({ rod }) => rod.rigid)
  if (rigid.length === 0 || Object.keys(loads).length === 0) return []
  const [{ id, rod, rodLength }] = rigid
  const error = rod.inertia - rod.mass * rod.cgFromBigEnd * (rodLength - rod.cgFromBigEnd)
  const size = quantityText(Math.abs(error), 'inertia', 'si')
  const side = error < 0 ? 'more' : 'less'
  return [
    `The rod of cylinder ${id} has its own inertia; two masses at its ends would have ${size} ${side}. Its couple is in these figures.`,
  ]
}
