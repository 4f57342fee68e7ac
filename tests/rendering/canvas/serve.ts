import { fileURLToPath } from 'node:url'
import { test as base } from '@playwright/test'
import { preview, build } from 'vite'

const root = fileURLToPath(new URL('../../../', import.meta.url))
const page = fileURLToPath(new URL('page/', import.meta.url))
const outDir = `${root}node_modules/.vite-canvas-page`

/** The page of ./page, bundled with its worker as a browser gets it. */
export const test = base.extend<object, { address: string }>({
  address: [
    async ({}, use) => {
      const shared = {
        configFile: false as const,
        root: page,
        logLevel: 'error' as const,
        build: { outDir, emptyOutDir: true },
      }
      await build({
        ...shared,
        resolve: { alias: [{ find: /^@\//, replacement: root }] },
        worker: { format: 'es' },
      })
      const server = await preview({ ...shared, preview: { host: '127.0.0.1', port: 0 } })
      await use(server.resolvedUrls?.local[0] ?? '')
      await server.close()
    },
    { scope: 'worker' },
  ],
})

export { expect } from '@playwright/test'
