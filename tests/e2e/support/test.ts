import { randomUUID } from 'node:crypto'
import { test as base, type BrowserContext, type Page } from '@playwright/test'

export { expect } from '@playwright/test'

export interface Person {
  name: string
  email: string
  password: string
}

interface Fixtures {
  /** Takes a browser of somebody into the test's care; `page` is in it already. */
  care: (context: BrowserContext) => Promise<void>
  /** Somebody nobody has met: not signed up yet. */
  stranger: Person
  /** Somebody who has just signed up and is signed in on `page`. */
  person: Person
  /** A page in a browser of its own, of somebody with no account. */
  guest: Page
}

const refusedByServer = /^Failed to load resource: the server responded with a status of 4\d\d/

/** Hears what goes wrong on any page: errors, and whatever is asked of another machine. */
function listen(context: BrowserContext, home: string, tell: (wrong: string) => void) {
  context.on('console', (message) => {
    // a 4xx answer is part of many a test and logged by the browser, not by a page
    if (message.type() === 'error' && !refusedByServer.test(message.text())) tell(message.text())
  })
  context.on('weberror', (error) => tell(String(error.error())))
  context.on('request', (request) => {
    const { protocol, origin } = new URL(request.url())
    if (/^(http|ws)s?:/.test(protocol) && origin !== home) tell(`asked of another machine: ${request.url()}`)
  })
}

/** Keeps the graphics card's name secret, as many browsers do: here it would say that WebGL is drawn by software. */
const hideCard = (context: BrowserContext) =>
  context.addInitScript(() => {
    const prototype = WebGL2RenderingContext.prototype
    const original = prototype.getExtension as (name: string) => unknown
    Object.assign(prototype, {
      getExtension(this: WebGL2RenderingContext, name: string) {
        return name === 'WEBGL_debug_renderer_info' ? null : original.call(this, name)
      },
    })
  })

export const test = base.extend<Fixtures>({
  care: [
    async ({ context, baseURL }, use, info) => {
      const wrong: string[] = []
      const care = async (one: BrowserContext) => {
        listen(one, new URL(baseURL ?? '').origin, (what) => wrong.push(what))
        if (info.project.name === 'webgl') await hideCard(one)
      }
      await care(context)
      await use(care)
      if (wrong.length) throw new Error(`The page complained:\n${wrong.join('\n')}`)
    },
    { auto: true },
  ],
  stranger: async ({}, use) => {
    await use({
      name: 'Tamsin Orrelby',
      email: `${randomUUID()}@example.com`,
      password: `four plain words ${randomUUID()}`,
    })
  },
  person: async ({ page, stranger }, use) => {
    await signUp(page, stranger)
    await use(stranger)
  },
  guest: async ({ browser, care }, use) => {
    const context = await browser.newContext()
    await care(context)
    await use(await context.newPage())
    await context.close()
  },
})

/** Signs up through the page, as a person would. */
export async function signUp(page: Page, { name, email, password }: Person) {
  await page.goto('/sign-up')
  await page.getByLabel('Your name').fill(name)
  await page.getByLabel('Mail address').fill(email)
  await page.getByLabel('Password', { exact: true }).fill(password)
  await page.getByRole('button', { name: 'Open workshop' }).click()
  await page.waitForURL('**/scenes')
}

export async function signIn(page: Page, { email, password }: Pick<Person, 'email' | 'password'>) {
  await page.goto('/sign-in')
  await page.getByLabel('Mail address').fill(email)
  await page.getByLabel('Password', { exact: true }).fill(password)
  await page.getByRole('button', { name: 'Sign in', exact: true }).click()
  await page.waitForURL('**/scenes')
}
