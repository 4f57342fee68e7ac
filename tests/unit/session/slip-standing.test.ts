import { describe, expect, it } from 'vitest'
import { inTrain } from '@/scene/session/path'
import { standingDoubts } from '@/scene/session/standing'
import { start, type Session } from './slip-bench'

interface Standing {
  code: string
  preset: string
  edits: [string, unknown][]
  says: string[]
  mend?: string
}
/** Taken, and asked about in the list. */
const standing: Standing[] = [
  {
    code: 'G03',
    preset: 'i4-2000',
    edits: [['cylinderDefaults.rodLengthMm', 105.1]],
    says: [
      'Rod to stroke 1.2.',
      'Below the usual 1.5 to 1.9 of a car engine',
      'leans up to',
      'Check the units',
    ],
    mend: 'Use 132 mm',
  },
  {
    code: 'G08',
    preset: 'i4-2000',
    edits: [['shape.pinLengthMm', 24]],
    says: ['Pin 24 mm + webs 47 mm + main 23 mm = 94 mm', 'stand 92 mm apart', '2 mm short'],
    mend: 'Use webs of 22.5 mm',
  },
  {
    code: 'G09',
    preset: 'i4-2000',
    edits: [
      ['shape.pinDiaMm', 30],
      ['shape.mainDiaMm', 30],
    ],
    says: ['No journal overlap (−13.8 mm)', 'Pin 30 mm', 'built-up crank', 'weak for one piece'],
    mend: 'It is built up',
  },
  {
    code: 'G10',
    preset: 'i4-2000',
    edits: [
      ['cylinderDefaults.offsetMm', 0],
      ['shape.deckHeightMm', 220.1],
    ],
    says: ['1.2 mm above the deck', '221 mm', 'the deck is at 220 mm'],
    mend: 'Use compression height 29.8 mm',
  },
  {
    code: 'M02',
    preset: 'i4-2000',
    edits: [['masses.pistonKg', 0.6]],
    says: ['Piston 600 g', 'Above the usual 220 to 480 g of a car engine'],
    mend: 'Use 480 g',
  },
  {
    code: 'M04',
    preset: 'i4-2000',
    edits: [['masses.rod.cgFromBigEndMm', 60]],
    says: ['0.41', '0.26 to 0.32'],
    mend: 'Use 46.8 mm',
  },
  {
    code: 'M08',
    preset: 'i4-2000',
    edits: [['masses.oilAllowanceKg', 0.012]],
    says: ['Oil allowance 12 g', '3 to 6 g'],
    mend: 'Use 6 g',
  },
  {
    code: 'A03',
    preset: 'v6-90s-3200',
    edits: [['throws.1.angleDeg', -75]],
    says: ['Split of 75°', 'of joint between the pin halves', 'above 60° a flying web'],
    mend: 'Use a split of 60°',
  },
  {
    code: 'R04',
    preset: 'v8f-4200',
    edits: [['operating.maxRpm', 10650]],
    says: [
      'Mean piston speed at the most 28.4 m/s',
      'Above the usual 21 to 27 m/s of a racing engine',
      'over-speed study',
    ],
    mend: 'Use 10,100 rpm',
  },
  {
    code: 'F09',
    preset: 'r7-11',
    edits: [],
    says: ['8 cylinders in one row', 'cannot fire evenly', 'odd count'],
  },
]

describe('what is unusual stands in the list', () => {
  it.each(standing)(
    '$code says the value with its unit, what is usual and why',
    ({ code, preset, edits, says, mend }) => {
      const session = start(preset, edits)
      if (code === 'F09') eight(session)
      const doubts = () =>
        standingDoubts(session.getState().scene.train, 'si').filter((doubt) => doubt.code === code)
      const [doubt] = doubts()
      for (const said of says) expect(`${doubt.head} ${doubt.message}`).toContain(said)
      expect(doubt.mend?.label).toBe(mend)
      if (!doubt.mend) return
      expect(session.edit(inTrain(doubt.mend.changes))).toBe(true)
      expect(doubts()).toEqual([])
      session.undo()
      expect(doubts()).toEqual([doubt])
    },
  )
  it('says it in inches where the sheet is in inches', () => {
    const session = start('i4-2000', [['masses.pistonKg', 0.6]])
    const doubt = standingDoubts(session.getState().scene.train, 'us').find(({ code }) => code === 'M02')!
    expect(doubt.message).toContain('oz of a car engine')
  })
})

/** One more bank and link rod in the row. */
function eight(session: Session) {
  const { train } = session.getState().scene
  const banks = Array.from({ length: 8 }, (_, i) => ({ id: `${i}`, angleDeg: 45 * i }))
  const cylinders = banks.map(({ id }, i) => ({
    ...train.cylinders[Math.min(i, 1)],
    id: `${i + 1}`,
    bank: id,
    ...(i > 0 && { link: { ...train.cylinders[1].link!, knuckleAngleDeg: 45 * i } }),
  }))
  const firing = ['1', '3', '5', '7', '2', '4', '6', '8']
  const next = { ...train, banks, cylinders, firingOrder: firing, collectors: [] }
  expect(session.edit([{ path: ['train'], value: next }])).toBe(true)
}
