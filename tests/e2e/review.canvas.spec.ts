import type { Page } from '@playwright/test'
import { expectNoBarriers } from './support/barriers'
import { saveScene } from './support/scenes'
import { expect, test } from './support/test'

async function send(page: Page, method: string, path: string, data?: object) {
  const headers = { 'sec-fetch-site': 'same-origin' }
  const answer = await page.request.fetch(`/api/v1/${path}`, { method, data, headers })
  expect(answer.ok(), await answer.text()).toBe(true)
  return answer.json()
}

const camera = { yawDeg: 35.25, pitchDeg: 12.5, distanceMm: 2400.75, targetMm: [0, 40.5, 10.25] }

/** A question pinned to the first piston, with another angle, view and layers than the scene was saved with. */
async function pinQuestion(page: Page, scene: string) {
  const { version } = await send(page, 'GET', `scenes/${scene}`)
  const overlays = { ...version.document.view.overlays, shaking: false }
  const { note } = await send(page, 'POST', `scenes/${scene}/notes`, {
    ...{ kind: 'question', heading: 'Oil hole', words: 'Leads by 40°: intended?' },
    anchor: {
      ...{ version: 1, partId: 'piston:1', pointMm: [0, 0, 0], angleDeg: 123.4, playing: false },
      ...{ speedRpm: 3000, camera, view: null, hidden: ['flywheel'], ghost: [], overlays },
      ...{ sectionAxialMm: null, units: 'si' },
    },
  })
  return note
}

const stage = (page: Page) => page.getByRole('application', { name: /moving drawing/ })

test('a reviewer by keyboard alone: pin, name a colleague, draw, reply, settle', async ({ page, person }) => {
  const scene = await saveScene(page, 'single-450')
  await page.goto(`/scenes/${scene}/review?version=1`)
  await expect(stage(page)).toHaveAttribute('data-still', 'true')
  const notes = page.getByRole('region', { name: 'Notes', exact: true })
  await page.getByRole('button', { name: 'Pin a note' }).focus()
  await page.keyboard.press('Enter')
  const part = notes.getByRole('spinbutton', { name: 'Part' })
  await expect(part).toBeFocused()
  await page.keyboard.press('p')
  await expect(part).toHaveAttribute('aria-valuetext', /^Piston/)
  await page.keyboard.press('Enter')

  // the kind has the focus: one to the left of remark is suggestion, and once more question
  const form = notes.getByRole('form', { name: 'New note' })
  await page.keyboard.press('ArrowLeft')
  await page.keyboard.press('ArrowLeft')
  await expect(form.getByRole('radio', { name: 'Question' })).toBeChecked()
  await form.getByRole('button', { name: 'Pin note' }).focus()
  await page.keyboard.press('Enter')
  await expect(form.getByRole('alert')).toContainText('Say in words')

  const words = form.getByRole('textbox', { name: /^What is it about/ })
  await words.focus()
  await page.keyboard.type(`Is it meant so, @${person.name.slice(0, 3)}`)
  await expect(form.getByRole('option', { name: person.name })).toHaveAttribute('aria-selected', 'true')
  await page.keyboard.press('Enter')
  await expect(words).toHaveValue(`Is it meant so, @${person.name} `)

  await form.getByRole('button', { name: 'Draw on the picture' }).focus()
  await page.keyboard.press('Enter')
  await expect(page.getByRole('application', { name: /^Draw here/ })).toBeFocused()
  await page.keyboard.press('Enter')
  for (let i = 0; i < 5; i++) await page.keyboard.press('ArrowRight')
  await page.keyboard.press('Enter')
  await expect(form.getByText('1 drawn.')).toBeVisible()
  await form.getByRole('textbox', { name: 'What it shows, in words' }).focus()
  await page.keyboard.type('An arrow along the crown')
  await page.keyboard.press('Enter')

  const thread = notes.getByRole('article', { name: 'Note 1' })
  await expect(thread).toContainText(`@${person.name}`)
  await expect(thread).toContainText('Drawn on the picture: An arrow along the crown')
  await thread.getByRole('textbox', { name: 'Your reply' }).focus()
  await page.keyboard.type('It is.')
  await thread.getByRole('button', { name: 'Reply' }).focus()
  await page.keyboard.press('Enter')
  await expect(thread.getByText('It is.', { exact: true })).toBeVisible()
  await expectNoBarriers(page)

  await thread.getByRole('button', { name: 'Settle…' }).focus()
  await page.keyboard.press('Enter')
  const dialog = page.getByRole('dialog')
  await expect(dialog.getByRole('radio', { name: 'Question answered' })).toBeChecked()
  await dialog.getByRole('button', { name: 'Settle', exact: true }).focus()
  await page.keyboard.press('Enter')
  await expect(thread).toContainText('Settled: question answered.')
})

test('a note’s address opens it at its angle, camera and layers; its drawing and flag stand there', async ({
  page,
  person,
}) => {
  expect(person.name).not.toBe('')
  const scene = await saveScene(page, 'single-450')
  const { number } = await pinQuestion(page, scene)
  await page.goto(`/scenes/${scene}/review?version=1&note=${number}`)
  await expect(stage(page)).toHaveAttribute('data-angle', /^123\.4/)
  await expect(page.getByRole('article', { name: 'Note 1' })).toContainText('at 123.4°')
  await expect(page.locator('.stage-pin')).toHaveText('1')
  // a note pinned now says where the eye is: at the very camera that was stored
  await page.getByRole('button', { name: 'Pin a note' }).click()
  await page.keyboard.press('Enter')
  await page.getByRole('textbox', { name: /^What is it about/ }).fill('From the same place.')
  await page.getByRole('button', { name: 'Pin note' }).click()
  await expect(page.getByRole('article', { name: 'Note 2' })).toBeVisible()
  const { note } = await send(page, 'GET', `scenes/${scene}/notes/2`)
  expect(note.anchor.angleDeg).toBeCloseTo(123.4, 6)
  expect(note.anchor.hidden).toEqual(['flywheel'])
  expect(note.anchor.overlays.shaking).toBe(false)
  const relative = (value: number, wanted: number) => Math.abs(value - wanted) / Math.abs(wanted)
  expect(relative(note.anchor.camera.yawDeg, camera.yawDeg)).toBeLessThan(1e-4)
  expect(relative(note.anchor.camera.pitchDeg, camera.pitchDeg)).toBeLessThan(1e-4)
  expect(relative(note.anchor.camera.distanceMm, camera.distanceMm)).toBeLessThan(1e-4)
  expect(relative(note.anchor.camera.targetMm[1], camera.targetMm[1])).toBeLessThan(1e-4)
})

test('somebody else settled it meanwhile: the dialog says so and nothing is lost', async ({
  page,
  person,
}) => {
  expect(person.name).not.toBe('')
  const scene = await saveScene(page, 'single-450')
  await pinQuestion(page, scene)
  await page.goto(`/scenes/${scene}/review?version=1`)
  await page
    .getByRole('button', { name: /Oil hole/ })
    .first()
    .click()
  const thread = page.getByRole('article', { name: 'Note 1' })
  await thread.getByRole('button', { name: 'Settle…' }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel('In words, if they help').fill('Read the drawing.')
  await send(page, 'POST', `scenes/${scene}/notes/1/settle`, {
    ...{ settlement: { reason: 'will-not-change' }, words: '' },
  })
  await dialog.getByRole('button', { name: 'Settle', exact: true }).click()
  await expect(dialog.getByRole('alert')).toBeVisible()
  await expect(dialog.getByLabel('In words, if they help')).toHaveValue('Read the drawing.')
  await dialog.getByRole('button', { name: 'Leave it open' }).click()
  await expect(thread).toContainText('Settled: will not change.')
})
