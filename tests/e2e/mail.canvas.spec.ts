import { expect, test } from './support/test'
import { saveScene, shareScene } from './support/scenes'
import { benchPage } from './bench-page'

test('a mail of one’s own leads to where its kind is turned off, which asks first', async ({
  page,
  person,
  guest,
}) => {
  const sceneId = await saveScene(page, 'single-450')
  const token = (await shareScene(page, sceneId)).split('/').at(-1)
  const question = { name: 'Delphine', email: 'delphine@example.com', question: 'Which one turns?' }
  const asked = await guest.request.post(`/api/v1/shared/${token}/questions`, {
    data: { ...question, writtenForMs: 5_000 },
  })
  expect(asked.status()).toBe(202)

  await guest.goto('/local/mail')
  const mail = guest.getByRole('article').filter({ hasText: person.email })
  await expect(mail).toContainText('> Which one turns?')
  await guest.getByRole('radio', { name: 'Text' }).press('ArrowRight')
  const letter = mail.frameLocator('iframe')
  await expect(letter.getByText('Which one turns?')).toBeVisible()
  await letter.getByRole('link', { name: 'Turn these mails off' }).click()

  await expect(guest.getByText('Questions from visitors of your links')).toBeVisible()
  await benchPage(guest).expectNoBarriers()
  await guest.getByRole('button', { name: 'Turn off' }).press('Enter')
  await expect(guest.getByRole('heading', { name: 'Turned off' })).toBeVisible()
  const answer = await page.request.get('/api/v1/mail-preferences')
  const { preferences } = (await answer.json()) as { preferences: { kind: string; wanted: boolean }[] }
  expect(preferences.filter(({ wanted }) => !wanted)).toEqual([{ kind: 'questions', wanted: false }])
})

test('an address that turns nothing off says so and offers nothing to press', async ({ guest }) => {
  await guest.goto('/unsubscribe?token=made-up')
  await expect(guest.getByText('This address turns nothing off.')).toBeVisible()
  await expect(guest.getByRole('button', { name: 'Turn off' })).toHaveCount(0)
})

test('which mails one gets is chosen on the account page and kept', async ({ page, person }) => {
  expect(person.name).not.toBe('')
  await page.goto('/account')
  const mentions = page.getByRole('switch', { name: 'Mentions of you in notes, gathered' })
  await expect(mentions).toBeChecked()
  const kept = page.waitForResponse('**/api/v1/mail-preferences')
  await mentions.press('Space')
  await expect(mentions).not.toBeChecked()
  expect((await kept).ok()).toBe(true)
  await page.reload()
  await expect(mentions).not.toBeChecked()
})
