import { mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { migrate } from '../../db/migrate.mjs'
import { stopLeftover } from '../../db/server/leftover.mjs'
import { ask, startCluster } from '../../db/server/postgres.mjs'
import { beganAt } from '../../db/server/processes.mjs'

const template = 'migrated'
const prefix = 'counterthrow-test-'

/** Ends what test runs that were killed have left: their folders carry their process number. */
async function sweep() {
  for (const name of readdirSync(tmpdir()).filter((entry) => entry.startsWith(prefix))) {
    if (beganAt(name.slice(prefix.length).split('-')[0]) !== null) continue
    await stopLeftover(join(tmpdir(), name, 'database/cluster'))
    rmSync(join(tmpdir(), name), { recursive: true, force: true })
  }
}

/** The same address with another database. */
export const databaseAt = (url, database) => Object.assign(new URL(url), { pathname: `/${database}` }).href

/** A throwaway server with a migrated database to copy from; both are gone after `stop()`. */
export async function startTestCluster() {
  await sweep()
  const dataFolder = mkdtempSync(join(tmpdir(), `${prefix}${process.pid}-`))
  const cluster = await startCluster({ dataFolder, throwaway: true })
  await ask(cluster.keeperUrl, `create database ${template}`)
  await migrate(databaseAt(cluster.url, template), databaseAt(cluster.keeperUrl, template))
  return {
    ...cluster,
    dataFolder,
    template,
    async stop() {
      await cluster.stop()
      rmSync(dataFolder, { recursive: true, force: true })
    },
  }
}

/** Vitest's global setup of the integration tests. */
export default async function setup(project) {
  const { url, keeperUrl, template, stop } = await startTestCluster()
  project.provide('cluster', { url, keeperUrl, template })
  return stop
}
