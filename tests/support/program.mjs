import { fileURLToPath } from 'node:url'
import { ensureBuild } from '../../db/server/build.mjs'
import { freePort, stopEverything } from '../../db/server/processes.mjs'
import { serve } from '../../db/server/serve.mjs'
import { work } from '../../db/server/work.mjs'

const root = fileURLToPath(new URL('../..', import.meta.url))
const distDir = '.next-test'

/** What serves and what works, as processes that can be killed; built before if it has to be. */
export const buildProgram = () => ensureBuild(root.replace(/\/$/, ''), distDir)

async function killed({ pid, ended }) {
  process.kill(-pid, 'SIGKILL')
  await ended
}

export async function startServer(environment) {
  const server = await serve({ root, port: await freePort(), distDir, environment })
  return { address: server.address, kill: () => killed(server) }
}

export async function startWorker(environment) {
  const worker = await work({ root, distDir, environment })
  return { kill: () => killed(worker) }
}

export { stopEverything }
