import { fileURLToPath } from 'node:url'
import { test as base, type Page } from '@playwright/test'
import { createServer } from 'vite'
import type { Harness } from './main'

const root = fileURLToPath(new URL('../../..', import.meta.url))

interface Worker {
  /** Where the page with the stage is served. */
  address: string
}

interface Each {
  /** Opens the stage and waits for its first still picture. */
  open(query: Record<string, string>): Promise<Page>
}

export const test = base.extend<Each, Worker>({
  address: [
    async ({}, use) => {
      const server = await createServer({
        configFile: false,
        root: fileURLToPath(new URL('.', import.meta.url)),
        cacheDir: `${root}node_modules/.vite-harness`,
        resolve: { alias: [{ find: /^@\//, replacement: root }] },
        server: { host: '127.0.0.1', port: 0, hmr: false, fs: { allow: [root] } },
        worker: { format: 'es' },
        optimizeDeps: { entries: ['main.ts'] },
        logLevel: 'error',
      })
      await server.listen()
      await use(server.resolvedUrls?.local[0] ?? '')
      await server.close()
    },
    { scope: 'worker' },
  ],
  open: async ({ page, address }, use) => {
    await use(async (query) => {
      await page.goto(`${address}?${new URLSearchParams(query)}`)
      await still(page)
      return page
    })
  },
})

export { expect } from '@playwright/test'

declare global {
  interface Window {
    harness: Harness
  }
}

/** The stage has drawn its last picture and sleeps. */
export const still = (page: Page, host = '#host') => page.locator(`${host}[data-still="true"]`).waitFor()
