import { fields } from '@/components/bench/fields'
import { ownField, ownNames } from '@/components/bench/own-fields'
import { tables } from '@/components/bench/part-tables'
import { firingOrder, throwAngles } from '@/components/bench/text-fields'
import { presetById } from '@/scene/model/presets'
import type { Field } from '@/scene/session/field'

const cell = (table: keyof typeof tables, column: string, index: number): Field => {
  const found = tables[table].columns.find(({ key }) => key === column)!
  if (found.is !== 'figure') throw new Error(`${column} is no figure`)
  return found.field(index)
}
const own = (name: string, cylinder: number) =>
  ownField(ownNames.find((each) => each.name === name)!.index, cylinder).field

export interface Held {
  code: string
  preset?: string
  edits?: [string, unknown][]
  field: Field
  typed: string
  /** What the note has to say: the value with its unit, the limit, why. */
  says: (string | RegExp)[]
  mend: string
  /** Where the document stands after the mend. */
  after: [path: string, value: unknown]
  /** Soft: may be kept as typed. */
  keep?: [path: string, value: unknown]
}

export const V8 = 'v8x-5000'
/** Typed into a field and held there, with the text kept; the drawing stands as it was. */
export const held: Held[] = [
  {
    code: 'G01',
    preset: 'i4-2000',
    edits: [['cylinderDefaults.offsetMm', 0]],
    field: fields.rodLength,
    typed: '43',
    says: ['too short to turn', '43 mm', '43.8 mm + 0 mm = 43.8 mm'],
    mend: 'Use rod 44 mm',
    after: ['cylinderDefaults.rodLengthMm', 44],
  },
  {
    code: 'G01',
    preset: 'i4-2000',
    edits: [['cylinderDefaults.offsetMm', 0]],
    field: fields.stroke,
    typed: '300',
    says: ['too short to turn', '146.5 mm', '150 mm'],
    mend: 'Use rod 501.7 mm with it',
    after: ['cylinderDefaults.strokeMm', 300],
  },
  {
    code: 'G02',
    preset: 'i4-2000',
    field: fields.offset,
    typed: '110',
    says: ['Offset 110 mm', 'leaves no full turn', '43.8 mm + 110 mm = 153.8 mm', '146.5 mm'],
    mend: 'Use offset 102 mm',
    after: ['cylinderDefaults.offsetMm', 102],
  },
  {
    code: 'G04',
    preset: 'i4-2000',
    field: fields.rodLength,
    typed: '577',
    says: ['Too long to be meant', '577 mm', '118 to 237 mm'],
    mend: 'Use 5.77 in = 147 mm',
    after: ['cylinderDefaults.rodLengthMm', 146.558],
    keep: ['cylinderDefaults.rodLengthMm', 577],
  },
  {
    code: 'G07',
    preset: 'i4-2000',
    field: fields.throwPitch,
    typed: '80',
    says: ['Bores overlap', 'Pitch 80 mm', 'bore 85.2 mm', 'no wall'],
    mend: 'Use bore 74.4 mm',
    after: ['cylinderDefaults.boreMm', 74.4],
    keep: ['throws.1.axialMm', -40],
  },
  {
    code: 'M01',
    field: fields.piston,
    typed: '-318',
    says: ['cannot be negative', 'You typed −318 g'],
    mend: 'Use 318 g',
    after: ['masses.pistonKg', 0.318],
  },
  {
    code: 'M02',
    preset: 'i4-2000',
    field: fields.piston,
    typed: '0.318',
    says: ['Too light to be meant', '0.318 g here', /usual is 161 to 346 g/],
    mend: 'Use 0.318 kg = 318 g',
    after: ['masses.pistonKg', 0.318],
    keep: ['masses.pistonKg', 0.000318],
  },
  {
    code: 'M03',
    preset: 'i4-2000',
    field: fields.piston,
    typed: '11.2',
    says: ['11.2 g here'],
    mend: 'Use 11.2 oz = 318 g',
    after: ['masses.pistonKg', 0.317514659],
    keep: ['masses.pistonKg', 0.0112],
  },
  {
    code: 'M04',
    preset: 'i4-2000',
    field: fields.rodCentre,
    typed: '0.28',
    says: ['A share, or a distance?', '0.28 mm from the big end', 'between the ends', '0.26 to 0.36'],
    mend: 'Use 0.28 of the rod = 41.02 mm',
    after: ['masses.rod.cgFromBigEndMm', 41.02],
    keep: ['masses.rod.cgFromBigEndMm', 0.28],
  },
  {
    code: 'M04',
    preset: 'i4-2000',
    field: fields.rodCentre,
    typed: '1.4',
    says: ['1.4 mm here', '29.3 to 65.9 mm'],
    mend: 'Use 1.4 in = 35.6 mm',
    after: ['masses.rod.cgFromBigEndMm', 35.56],
    keep: ['masses.rod.cgFromBigEndMm', 1.4],
  },
  {
    code: 'M04',
    preset: 'i4-2000',
    field: fields.rodCentre,
    typed: '150',
    says: ['150 mm from the big end', 'beyond its small end at 146.5 mm'],
    mend: 'Use 42 mm, 0.28 of the rod',
    after: ['masses.rod.cgFromBigEndMm', 42],
  },
  {
    code: 'M06',
    field: fields.balanceFactor,
    typed: '0.5',
    says: ['0.5 %?', 'Factors are percent'],
    mend: 'Use 50 %',
    after: ['balanceFactor', 0.5],
    keep: ['balanceFactor', 0.005],
  },
  {
    code: 'M07',
    field: fields.balanceFactor,
    typed: '100',
    says: ['Which definition?', '100 % of one piston on a pin with 2 rods is 50 % of all on it'],
    mend: 'Use 50 %',
    after: ['balanceFactor', 0.5],
    keep: ['balanceFactor', 1],
  },
  {
    code: 'M08',
    preset: 'i4-2000',
    field: fields.oil,
    typed: '60',
    says: ['60 g here', '1.00 to 8.00 g'],
    mend: 'Use 6 g',
    after: ['masses.oilAllowanceKg', 0.006],
    keep: ['masses.oilAllowanceKg', 0.06],
  },
  {
    code: 'F01',
    preset: 'i4-2000',
    field: firingOrder,
    typed: '1-3-3-2',
    says: ['cylinder 3 appears more than once', '4 is missing'],
    mend: 'Use order 1-3-4-2',
    after: ['firingOrder', ['1', '3', '4', '2']],
  },
  {
    code: 'F02',
    preset: 'i4-2000',
    field: firingOrder,
    typed: '1-3-4-2-5',
    says: ['5 entries for 4 cylinders', 'no cylinder 5'],
    mend: 'Use order 1-3-4-2',
    after: ['firingOrder', ['1', '3', '4', '2']],
  },
  {
    code: 'F03',
    preset: 'i4-2000',
    field: firingOrder,
    typed: '1-2-3-4',
    says: ['contradicts the crank', /top dead centre at/, 'Orders that fit: 1-', '1-3-4-2', '1-2-4-3'],
    mend: 'Use order 1-3-4-2',
    after: ['firingOrder', ['1', '3', '4', '2']],
  },
  {
    code: 'F04',
    preset: 'i3-1000',
    edits: [
      [
        'throws',
        presetById('i3-1000')!.train.throws.map((pin, i) => ({ ...pin, angleDeg: [0, 240, 120][i] })),
      ],
    ],
    field: throwAngles,
    typed: '0/120/240',
    says: ['bunched', '1-3-2', 'pause of 480°', 'The even order is 1-2-3', 'throws at 0/240/120'],
    mend: 'Use order 1-2-3',
    after: ['firingOrder', ['1', '2', '3']],
    keep: ['throws.1.angleDeg', 120],
  },
  {
    code: 'F05',
    preset: 'r7-11',
    field: firingOrder,
    typed: '1-2-3-4-5-6-7',
    says: ['bunched', '1-2-3-4-5-6-7 fits', /pause of 4\d\d°/, 'The even order is 1-3-5-7-2-4-6'],
    mend: 'Use order 1-3-5-7-2-4-6',
    after: ['firingOrder', ['1', '3', '5', '7', '2', '4', '6']],
    keep: ['firingOrder', ['1', '2', '3', '4', '5', '6', '7']],
  },
  {
    code: 'F06',
    preset: 'v2-45-1600',
    field: cell('cylinders', 'firesAtDeg', 1),
    typed: '200',
    says: ['Cylinder 2 cannot fire at 200°', 'top dead centre at 22.5° and 382.5°'],
    mend: 'Use 22.5°',
    after: ['cylinders.1.firesAtDeg', 22.5],
  },
  {
    code: 'F07',
    preset: 'i4-2000',
    field: firingOrder,
    typed: '180-180-180-160',
    says: ['add up to 700°', 'must be 720°'],
    mend: 'Use 180-180-180-180',
    after: ['firingOrder', ['1', '3', '4', '2']],
  },
  {
    code: 'F08',
    preset: 'm6-2t-520',
    field: cell('cylinders', 'firesAtDeg', 1),
    typed: '420',
    says: ['cannot fire at 420°', 'the cycle ends at 360°'],
    mend: 'Use 240°',
    after: ['cylinders.1.firesAtDeg', 240],
  },
  {
    code: 'F10',
    field: firingOrder,
    typed: '1L-4R-2R-2L-3R-3L-4L-1R',
    says: ['L and R labels', 'SAE J824, method B'],
    mend: 'Use 1-8-4-3-6-5-7-2',
    after: ['firingOrder', ['1', '8', '4', '3', '6', '5', '7', '2']],
  },
  {
    code: 'A01',
    preset: 'v2-45-1600',
    field: fields.bankAngle,
    typed: '900',
    says: ['900° wraps to 180°'],
    mend: 'Use 180°',
    after: ['banks.1.angleDeg', 90],
    keep: ['banks.1.angleDeg', 450],
  },
  {
    code: 'A01',
    preset: 'i3-1000',
    field: throwAngles,
    typed: '0/600/120',
    says: ['600° wraps to 240°'],
    mend: 'Use 240°',
    after: ['throws.1.angleDeg', 240],
    keep: ['throws.1.angleDeg', 600],
  },
  {
    code: 'R01',
    preset: 'i4-2000',
    field: fields.idle,
    typed: '8000',
    says: ['Idle 8,000 rpm must be below rated 6,000 rpm'],
    mend: 'Use 800 rpm',
    after: ['operating.idleRpm', 800],
  },
  {
    code: 'R02',
    preset: 'i4-2000',
    field: fields.most,
    typed: '68000',
    says: ['Extra zero?', '68,000 rpm', 'mean piston speed of 199 m/s', 'up to 22'],
    mend: 'Use 6800 rpm',
    after: ['operating.maxRpm', 6800],
    keep: ['operating.maxRpm', 68000],
  },
  {
    code: 'P01',
    preset: 'i4-2000',
    field: fields.intake,
    typed: '195',
    says: ['195 bar here', '0.300 to 5.00 bar'],
    mend: 'Use 195 kPa = 1.95 bar',
    after: ['gas.intakePressureBar', 1.95],
    keep: ['gas.intakePressureBar', 195],
  },
  {
    code: 'U01',
    preset: 'i4-2000',
    field: fields.bore,
    typed: '85,200',
    says: ['Did you mean 85.2 or 85200?'],
    mend: 'Use 85.2',
    after: ['cylinderDefaults.boreMm', 85.2],
  },
  {
    code: 'U02',
    field: cell('throws', 'unbalanceKgMm', 0),
    typed: '12 ozf in',
    says: ['mass × distance (oz in)', 'not torque (ozf in)'],
    mend: 'Use 12 oz in',
    after: ['throws.0.unbalanceKgMm', 8.6409346485],
  },
  {
    code: 'U03',
    field: fields.bore,
    typed: '3.74',
    says: ['3.74 mm here'],
    mend: 'Use 3.74 in = 95.0 mm',
    after: ['cylinderDefaults.boreMm', 94.996],
    keep: ['cylinderDefaults.boreMm', 3.74],
  },
  {
    code: 'own',
    edits: [['cylinders.2.strokeMm', 88.2]],
    field: own('Stroke', 2),
    typed: '90',
    says: ['share its radius', '90 mm', '88.2 mm'],
    mend: 'Use it for all on throw 2',
    after: ['cylinders.3.strokeMm', 90],
  },
]
