import { fileURLToPath } from 'node:url'
import { test as base } from '@playwright/test'
import { preview, build } from 'vite'

const root = fileURLToPath(new URL('../../../', import.meta.url))

/** A test with the page of a folder, bundled with its workers as a browser gets it. */
export const servedPage = (folder: string) =>
  base.extend<object, { address: string }>({
    address: [
      async ({}, use) => {
        const shared = {
          configFile: false as const,
          root: `${root}${folder}`,
          logLevel: 'error' as const,
          build: { outDir: `${root}node_modules/.vite-${folder.replaceAll('/', '-')}`, emptyOutDir: true },
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
