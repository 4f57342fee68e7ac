import { readFile, writeFile } from 'node:fs/promises'
import { benchPage, notes } from './bench-page'
import { expectColoursApart } from './support/barriers'
import { expect, test } from './support/test'

test('a preset fills the sheet, and undo brings the old drawing back', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000')
  await expect(bench.title).toHaveValue('90° V8 5.0 L, cross plane')
  await bench.preset('radial')
  await expect(bench.title).toHaveValue('Seven-cylinder radial 11 L')
  await expect(bench.field('Firing order')).toHaveValue('1-3-5-7-2-4-6')
  await expect(bench.field('Bore')).toHaveValue('128.0')
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(bench.title).toHaveValue('90° V8 5.0 L, cross plane')
})

test('a bore of 3.74 in is understood, shows at once and is one step back', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000')
  await page.getByRole('tab', { name: 'Fits' }).click()
  const volume = page.locator('.kv-row', { hasText: 'All cylinders' })
  await expect(volume).toContainText('5,001')
  await bench.type('Bore', '3.7 in')
  await expect(bench.field('Bore')).toHaveValue('93.98')
  await expect(volume).toContainText('4,895')
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(bench.field('Bore')).toHaveValue('95.0')
  await expect(volume).toContainText('5,001')
})

test('a rod too short to turn is refused beside its field, and the last good engine keeps running', async ({
  page,
}) => {
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000', 'running')
  await bench.type('Rod, centres', '40')
  await expect(bench.field('Rod, centres')).toHaveValue('40')
  await expect(bench.field('Rod, centres')).toHaveAttribute('aria-invalid', 'true')
  await expect(bench.note).toContainText('too short to turn')
  await expect(page.getByText('1 value not taken')).toBeVisible()
  const before = await page.locator('.words').textContent()
  await expect(page.locator('.words')).not.toHaveText(before!)
  await page.getByRole('button', { name: 'Use rod 45 mm' }).click()
  await expect(bench.field('Rod, centres')).toHaveValue('45.0')
  await expect(bench.note).toHaveCount(0)
})

test('0.388 g for a piston is held, with the same figure in kilograms one press away', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000')
  await bench.type('Piston, bare', '0.388')
  await expect(bench.note).toContainText('Too light to be meant.')
  await page.getByRole('link', { name: 'Piston, bare' }).click()
  await expect(bench.field('Piston, bare')).toBeFocused()
  await page.getByRole('button', { name: 'Use 0.388 kg = 388 g' }).click()
  await expect(bench.field('Piston, bare')).toHaveValue('388.0')
})

test('drag, click, arrow keys, step buttons and typing move one angle', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000')
  await bench.still('22')
  await bench.expectAngle('22.0')
  await bench.strip.press('ArrowRight')
  await bench.expectAngle('23.0')
  await bench.strip.press('Shift+ArrowLeft')
  await bench.expectAngle('22.9')
  await page.getByRole('button', { name: 'On 1 degree' }).click()
  await bench.expectAngle('24.0')
  await page.getByRole('button', { name: 'Back 0.1 degrees' }).click()
  await bench.expectAngle('23.9')
  await bench.strip.press('Home')
  await bench.expectAngle('0.0')
  await page.getByRole('button', { name: 'Back 1 degree' }).click()
  await bench.expectAngle('719.0')

  const box = (await page.locator('.lanes').boundingBox())!
  await page.mouse.move(box.x + 300, box.y + 60)
  await page.mouse.down()
  await page.mouse.move(box.x + 400, box.y + 60, { steps: 4 })
  await page.mouse.up()
  const dragged = await bench.strip.getAttribute('aria-valuenow')
  expect(Number(dragged)).toBeGreaterThan(100)
  await bench.expectAngle(dragged!)
})

test('it runs, stands and turns back at the slowed clock', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=i4-2000', 'running')
  const flag = page.getByLabel('Crank angle, degrees')
  await page.getByRole('button', { name: 'Pause' }).click()
  const stood = await flag.inputValue()
  await page.getByRole('button', { name: 'Play' }).click()
  await expect(flag).not.toHaveValue(stood)
  await page.getByRole('slider', { name: 'Shown speed' }).press('Home')
  await expect(page.getByText('Shown at 1 : 2,000, 3.0 rpm')).toBeVisible()
  await page.getByRole('button', { name: 'Pause' }).click()
  await bench.still('180')
  await page.getByRole('button', { name: 'Reverse' }).click()
  await page.getByRole('button', { name: 'Play' }).click()
  await expect.poll(async () => parseFloat(await flag.inputValue())).toBeLessThan(180)
  await bench.type('Engine speed', '9,000')
  await expect(page.getByText('Over speed.')).toBeVisible()
})

test('one switch turns every unit, is remembered, and leaves the document alone', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000')
  await bench.still()
  await page.getByRole('radio', { name: 'in, oz' }).click()
  await expect(bench.field('Bore')).toHaveValue('3.740')
  await expect(page.locator('.otab thead').first()).toContainText('lbf')
  await page.reload()
  await expect(bench.field('Bore')).toHaveValue('3.740')
  for (const name of ['mm, g', 'in, oz', 'mm, g']) await page.getByRole('radio', { name }).click()
  await expect(bench.field('Bore')).toHaveValue('95.0')
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled()
})

test('a scene goes out as a file and comes back; a wrong file says where and why', async ({ page }, info) => {
  const bench = benchPage(page)
  await bench.open('?preset=i3-1000')
  await bench.type('Bore', '74')
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'Download' }).click(),
  ])
  expect(download.suggestedFilename()).toBe('in-line-three-1-0-l.json')
  const path = info.outputPath('scene.json')
  await download.saveAs(path)
  await bench.preset('v12')
  await page.getByLabel('Bring in…').setInputFiles(path)
  await expect(bench.title).toHaveValue('In-line three 1.0 L')
  await expect(bench.field('Bore')).toHaveValue('74.0')

  const scene = JSON.parse(await readFile(path, 'utf8'))
  scene.train.cylinderDefaults.rodLengthMm = 20
  const wrong = info.outputPath('wrong.json')
  await writeFile(wrong, JSON.stringify(scene))
  await page.getByLabel('Bring in…').setInputFiles(wrong)
  const dialog = page.getByRole('dialog', { name: 'This file was not taken' })
  await expect(dialog).toContainText('train.cylinderDefaults.rodLengthMm')
  await expect(dialog).toContainText('too short to turn')
  await dialog.getByRole('button', { name: 'Keep the drawing' }).click()
  await expect(bench.field('Bore')).toHaveValue('74.0')
})

test('a draft survives a closed tab', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=i4-2000')
  await bench.type('Stroke', '90')
  await expect(page.getByText(/Draft kept \d\d:\d\d/)).toBeVisible()
  await page.goto('about:blank')
  await bench.open()
  await expect(bench.title).toHaveValue('In-line four 2.0 L, flat plane')
  await expect(bench.field('Stroke')).toHaveValue('90.0')
})

test('any train can be set out, and taken apart cylinder by cylinder', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=i4-2000')
  await page.getByRole('button', { name: 'Set out…' }).click()
  const dialog = page.getByRole('dialog', { name: 'Set out a crank train' })
  await dialog.getByLabel('Title').fill('Odd three-bank six')
  await dialog.getByLabel('Bank angles, from upright').fill('-60/0/60')
  await dialog.getByLabel('Throw angles, free end first').fill('0/180')
  await dialog.getByRole('button', { name: 'Set out', exact: true }).last().click()
  await expect(bench.title).toHaveValue('Odd three-bank six')
  await page.getByRole('button', { name: 'Cylinder by cylinder, 6' }).click()
  await page.getByRole('button', { name: 'Take out 6' }).click()
  await expect(page.getByRole('button', { name: 'Cylinder by cylinder, 5' })).toBeVisible()
  await page.getByRole('button', { name: 'Add a cylinder' }).click()
  await expect(page.getByRole('button', { name: 'Cylinder by cylinder, 6' })).toBeVisible()
  await expect(bench.note).toHaveCount(0)
})

test('throws that contradict the order offer the order that fits', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=m6-2t-520')
  await bench.type('Throws', '0/240/120/180/60/300')
  await expect(bench.note).toContainText('contradicts the crank')
  await page.getByRole('button', { name: /^Use order/ }).click()
  await expect(bench.note).toHaveCount(0)
  await expect(bench.field('Throws')).toHaveValue('0/240/120/180/60/300')
  await expect(bench.field('Firing order')).toHaveValue('1-6-2-4-3-5')
})

test('saving needs a sign-in and says that the draft waits', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=i4-2000')
  await page.getByRole('button', { name: 'Save version 1' }).click()
  const dialog = page.getByRole('dialog', { name: 'Sign in to save' })
  await expect(dialog).toContainText('Your draft is kept here')
  await expect(dialog.getByRole('link', { name: 'Sign in' })).toHaveAttribute('href', '/sign-in?next=/bench')
  await page.keyboard.press('Escape')
  await expect(dialog).toHaveCount(0)
})

test('by keyboard alone: to the drawing, turn it, step the crank, read the notes, change a value', async ({
  page,
}) => {
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000', 'running')
  await page.keyboard.press('Tab')
  await expect(page.getByRole('link', { name: 'To the drawing' })).toBeFocused()
  await bench.still('10')
  await bench.drawing.focus()
  await page.keyboard.press(']')
  await bench.expectAngle('11.0')
  await page.keyboard.press('Shift+[')
  await bench.expectAngle('1.0')
  await page.keyboard.press('Space')
  await expect(page.getByRole('button', { name: 'Pause' })).toBeVisible()
  await page.keyboard.press('Space')
  await notes(page).getByRole('tab', { name: 'Balance' }).focus()
  await page.keyboard.press('ArrowRight')
  await expect(notes(page).getByRole('tab', { name: 'Loads' })).toBeFocused()
  await expect(page.getByRole('heading', { name: 'Turning moment all cylinders' })).toBeVisible()
  await bench.field('Bore').focus()
  await page.keyboard.type('93')
  await page.keyboard.press('Enter')
  await expect(bench.field('Bore')).toHaveValue('93.0')
  await page.getByRole('button', { name: 'Play' }).focus()
  await page.keyboard.press('Control+z')
  await expect(bench.field('Bore')).toHaveValue('95.0')
})

test('no barrier on the sheet with a refused value, an open table, every page of notes and the dialogs', async ({
  page,
}) => {
  // the barrier check reads every node of a large page, several times
  test.slow()
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000')
  await bench.type('Rod, centres', '40')
  await page.getByRole('button', { name: 'Counterweights, 8' }).click()
  await page.getByRole('button', { name: 'Show', exact: true }).click()
  await bench.expectNoBarriers()
  await page.emulateMedia({ colorScheme: 'dark', reducedMotion: 'reduce' })
  await expectColoursApart(page)
  for (const name of ['Loads', 'Motion', 'Fits']) {
    await notes(page).getByRole('tab', { name }).click()
    await bench.expectNoBarriers('.notes')
  }
  for (const name of ['Presets…', 'Set out…']) {
    await page.getByRole('button', { name }).click()
    await bench.expectNoBarriers('dialog')
    await page.keyboard.press('Escape')
  }
})

test('with reduced motion it stands at top dead centre, and the strip still moves it', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000', 'found')
  await bench.expectAngle('0.0')
  await expect(page.getByRole('button', { name: 'Play' })).toHaveCount(0)
  await expect(page.getByRole('button', { name: 'Pause' })).toHaveCount(0)
  await bench.strip.press('ArrowRight')
  await bench.expectAngle('1.0')
})

test('the sheet fits a screen of 1440 by 900, and scrolls only downwards on smaller ones', async ({
  page,
}) => {
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000')
  const tall = await page.evaluate(() => document.documentElement.scrollHeight - window.innerHeight)
  expect(tall).toBeLessThanOrEqual(0)
  for (const width of [1440, 1024, 768, 390, 320]) {
    await page.setViewportSize({ width, height: 900 })
    await bench.expectNoSidewaysScroll()
  }
})

test('the chosen paper stays', async ({ page }) => {
  await page.emulateMedia({ colorScheme: 'light' })
  const bench = benchPage(page)
  await bench.open('?preset=i4-2000')
  await page.getByRole('button', { name: 'paper: system' }).click()
  await page.getByRole('button', { name: 'paper: vellum' }).click()
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark')
  await page.reload()
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark')
  await expect(page.getByRole('button', { name: 'paper: slate' })).toBeVisible()
})
