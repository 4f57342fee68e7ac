import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { readPdf } from '@/tests/support/paper/read-pdf'
import { designSheet } from '@/lib/export/design-sheet'
import { faceFiles } from '@/lib/export/font-files'
import type { FaceFiles } from '@/lib/export/typesetter'
import { method } from '@/lib/mechanics/method'
import { printCautions } from '@/lib/sheet/print-cautions'
import { sheetContent, type SheetRequest } from '@/lib/sheet/sheet-content'
import { sheetParts, type Paper } from '@/lib/sheet/sheet-parts'
import { newScene } from '@/scene/model/default-scene'
import { presetById, presets } from '@/scene/model/presets'
import type { CrankTrain } from '@/scene/model/crank-train'

const fonts = Object.fromEntries(
  Object.entries(faceFiles).map(([face, file]) => [face, new Uint8Array(readFileSync(file))]),
) as FaceFiles

const train = (id: string) => presetById(id)!.train
const contentOf = (document: CrankTrain, more: Partial<SheetRequest> = {}) => {
  const scene = newScene(document)
  return sheetContent({
    scene,
    units: 'both',
    parts: sheetParts,
    stamp: { title: document.title, date: '1 December 2026' },
    ...more,
  })
}
const sheetOf = async (document: CrankTrain, more: Partial<SheetRequest> = {}, paper: Paper = 'A4') =>
  readPdf(await designSheet({ content: contentOf(document, more), paper, picture: null, fonts }))

describe('designSheet', () => {
  it('is tagged, has title and language, and a structure of headings, tables and figures with words', async () => {
    const { info, marked, pages } = await sheetOf(train('v8x-5000'))
    expect(marked).toBe(true)
    expect(info).toMatchObject({ Title: '90° V8 5.0 L, cross plane: design sheet', Language: 'en' })
    const roles = pages.flatMap(({ roles: found }) => found)
    for (const role of ['H1', 'H2', 'H3', 'Table', 'TR', 'TH', 'TD', 'L', 'LI', 'P'])
      expect(
        roles.some((node) => node.role === role),
        role,
      ).toBe(true)
    const figures = roles.filter(({ role }) => role === 'Figure')
    expect(figures.length).toBe(2)
    expect(figures.map(({ alt }) => alt)).toEqual([
      expect.stringContaining('Crank star seen from the free end, turning clockwise: pin 1 at 0°'),
      expect.stringContaining('Order 1-8-4-3-6-5-7-2.'),
    ])
  })

  it('the minus, degree, times, square and cube signs come back as they were set', async () => {
    const { pages } = await sheetOf(train('v8x-5000'))
    const text = pages.map((page) => page.text).join(' ')
    for (const words of ['−191.0', '198.4', '90°', 'kg mm ²', 'cm ³', 'Mass × radius, g mm'])
      expect(text.replace(/ ?([²³])/g, ' $1'), words).toContain(words)
    expect(text).not.toContain('\uFFFD')
  })

  it.each(presets.map(({ id, train: document }) => [id, document] as const))(
    'designSheet(%s) keeps every word on its page and repeats the title block on each',
    async (_, document) => {
      const { pages } = await sheetOf(document)
      pages.forEach(({ text, beyond }, index) => {
        expect(beyond).toEqual([])
        expect(text).toContain(`${index + 1} of ${pages.length}`)
        expect(text).toContain(method.version)
        expect(text).toContain('1 December 2026')
      })
    },
  )

  it.each([
    ['A4', 841.89, 595.28],
    ['Letter', 792, 612],
  ] as const)('paper %s is %s by %s points', async (paper, width, height) => {
    const { pages } = await sheetOf(train('i3-1000'), {}, paper)
    for (const page of pages) {
      expect(page.width).toBeCloseTo(width, 1)
      expect(page.height).toBeCloseTo(height, 1)
      expect(page.beyond).toEqual([])
    }
  })

  it('figures are those of the analysis: v8f at 9,000 rpm shakes 31.8 kN across in the textbook, 32.3 exactly', async () => {
    const document = train('v8f-4200')
    const scene = newScene(document)
    const { pages } = await sheetOf(document, {
      scene: { ...scene, view: { ...scene.view, speedRpm: 9000 } },
    })
    const text = pages.map((page) => page.text).join(' ')
    expect(text).toContain('Crank angle 0.0°, at 9,000 rpm')
    // TRADE 2.5, D-07: 31.8 kN is 4 root 2 F2 with the first term; the series adds 1.96 % at this ratio
    const [, horizontal] = /\b2 0\.0 (\d+\.\d) /.exec(text) ?? []
    expect(Number(horizontal) / 31.8).toBeCloseTo(1.02, 2)
  })

  it('prints the cautions and the limits of the method whatever is left out', async () => {
    const { pages } = await sheetOf(train('i4-2000'), { parts: [] })
    const text = pages.map((page) => page.text).join(' ')
    for (const caution of printCautions) expect(text).toContain(caution.split('.')[0])
    expect(text).toContain('Rigid crank at constant speed')
    expect(text).not.toContain('Counterweights')
    expect(text).not.toContain('What a class society asks for')
  })

  it('prints scene and version where it is a saved one, and units as asked', async () => {
    const stamp = {
      title: 'Twin',
      date: '1 December 2026',
      sceneId: '0190d3b2-7c1e-7a66-8f00-0123456789ab',
      version: 4,
    }
    const { pages } = await sheetOf(train('v2-45-1600'), { stamp, units: 'us' })
    const text = pages.map((page) => page.text).join(' ')
    expect(text.replaceAll(' ', '')).toContain(stamp.sceneId)
    expect(text).toMatch(/Version 4\b/)
    expect(text).toContain('lbf ft')
    expect(text).not.toContain('N m')
  })

  it('sets a title with letters that no face has, and one far too long', async () => {
    const title = `Ångström ${'very long name of an engine '.repeat(7)}`.slice(0, 200)
    const { pages } = await sheetOf(
      { ...train('i3-1000'), title },
      { stamp: { title, date: '1 December 2026' } },
    )
    expect(pages[0].text).toContain('Ångström very long')
    expect(pages[0].beyond).toEqual([])
    const other = await sheetOf(train('i3-1000'), { stamp: { title: 'Мотор ẽ', date: '1 December 2026' } })
    expect(other.pages[0].text).toContain('????? e')
  })
})

describe('sheetContent', () => {
  it('lists what a class society asks for: a preset lacks power and web masses, a bare train more', () => {
    const standing = (document: CrankTrain) =>
      Object.fromEntries(contentOf(document).completeness!.map((asked) => [asked.item, asked.standing]))
    const preset = standing(train('m6-2t-520'))
    expect(Object.keys(preset)).toHaveLength(18)
    expect(preset).toMatchObject({
      'Maximum cylinder pressure': 'present',
      'Gas pressure over crank angle, digitised': 'in part',
      'Crank-web mass and its centre of gravity': 'in part',
    })
    const { inertiaKgMm2: _left, ...rod } = train('i4-2000').masses.rod!
    const bare = standing({
      ...train('i4-2000'),
      gas: { model: 'none' },
      operating: undefined,
      masses: { ...train('i4-2000').masses, rod },
    })
    expect(bare).toMatchObject({
      'Maximum cylinder pressure': 'missing',
      'Mean indicated pressure': 'missing',
      'Rod radius of gyration': 'missing',
      'Power and speed at maximum continuous rating': 'missing',
      'Bore and stroke': 'present',
    })
  })

  it('mean indicated pressure is the work of the closed cycle over the volume: the set point of the preset', () => {
    const asked = contentOf(train('v8x-5000')).completeness!.find(
      ({ item }) => item === 'Mean indicated pressure',
    )!
    // TRADE 8.1 gives 13.4 bar gross; net differs by up to 1.4 %
    expect(Math.abs(Number.parseFloat(asked.found) / 13.4 - 1)).toBeLessThan(0.014)
  })

  it('the star has every throw and cylinder, mirrored for an engine that turns the other way', () => {
    const document = train('v8x-5000')
    const other = contentOf({ ...document, rotation: 'counterclockwise' }).star
    const star = contentOf(document).star
    const words = (drawing: typeof star) =>
      drawing.marks.flatMap((mark) => (mark.kind === 'text' ? [mark] : []))
    for (const { id } of document.throws) expect(words(star).some(({ text }) => text === id)).toBe(true)
    const place = (drawing: typeof star, text: string) => words(drawing).find((mark) => mark.text === text)!.x
    expect(place(star, '2') - 130).toBeCloseTo(130 - place(other, '2'), 9)
    expect(place(star, '2')).toBeGreaterThan(130)
  })
})
