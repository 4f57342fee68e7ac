import { spawnSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import {
  chmodSync,
  chownSync,
  existsSync,
  mkdirSync,
  readFileSync,
  renameSync,
  rmdirSync,
  writeFileSync,
} from 'node:fs'
import { join } from 'node:path'
import { stopLeftover } from './leftover.mjs'
import { Refusal } from './processes.mjs'

const farRoot = '/var/lib/counterthrow'

/** PostgreSQL refuses to run as root: then it runs as Debian's `postgres`. Empty where it runs as oneself. */
export function serverUser() {
  if (process.getuid?.() !== 0) return {}
  const users = readFileSync('/etc/passwd', 'utf8').split('\n')
  const line = users.find((entry) => entry.startsWith('postgres:'))
  if (!line)
    throw new Refusal('PostgreSQL does not run as root and there is no user named postgres to run it as.')
  const [, , uid, gid] = line.split(':')
  return { uid: Number(uid), gid: Number(gid) }
}

/** Makes the folder the user's own; false when that user cannot get there. */
function handOver(folder, user) {
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  if (user.uid === undefined) return true
  try {
    chownSync(folder, user.uid, user.gid)
  } catch {
    return false
  }
  return spawnSync('test', ['-w', folder], { ...user, cwd: '/' }).status === 0
}

/**
 * The folder that holds the server's files: in the data folder or, where the server's user cannot get there
 * (a checkout under a closed home folder, started as root), under /var/lib, with a pointer left in the data folder.
 */
export async function placeFor(dataFolder, user) {
  const near = join(dataFolder, 'database')
  const pointer = join(dataFolder, 'database.elsewhere')
  const far = join(farRoot, createHash('sha256').update(dataFolder).digest('hex').slice(0, 16))

  if (!existsSync(pointer)) {
    // the server's user must be let through this folder, not read it
    chmodSync(dataFolder, user.uid === undefined ? 0o700 : 0o711)
    const used = existsSync(join(near, 'cluster'))
    if (handOver(near, user)) return near
    if (used) throw new Refusal(`The database in ${near} can no longer be reached by the user postgres.`)
    rmdirSync(near)
    if (existsSync(far)) await setAside(far)
    mkdirSync(farRoot, { recursive: true, mode: 0o711 })
    if (!handOver(far, user)) throw new Refusal(`The user postgres can reach neither ${near} nor ${far}.`)
    writeFileSync(join(far, 'data-folder'), dataFolder + '\n')
    writeFileSync(pointer, far + '\n')
    return far
  }

  const kept = readFileSync(pointer, 'utf8').trim()
  if (!existsSync(kept)) {
    throw new Refusal(
      `The database of ${dataFolder} was kept in ${kept}, which is gone. Delete ${pointer} to begin anew.`,
    )
  }
  if (kept !== far) await follow(kept, far, dataFolder, pointer)
  return far
}

/** The data folder has been moved: its database is renamed after it. A copy must not share the original's. */
async function follow(kept, far, dataFolder, pointer) {
  const original = readFileSync(join(kept, 'data-folder'), 'utf8').trim()
  if (existsSync(original)) {
    throw new Refusal(
      `${dataFolder} is a copy of ${original}, whose database is in ${kept}. Delete ${pointer} to begin anew.`,
    )
  }
  await stopLeftover(join(kept, 'cluster'))
  renameSync(kept, far)
  writeFileSync(join(far, 'data-folder'), dataFolder + '\n')
  writeFileSync(pointer, far + '\n')
}

/** The data folder was deleted and its database stayed: it is kept under another name, never reused. */
async function setAside(far) {
  await stopLeftover(join(far, 'cluster'))
  const aside = `${far}.${new Date().toISOString().replaceAll(':', '')}`
  renameSync(far, aside)
  console.log(`A database of an earlier data folder of this name was found; it is kept in ${aside}`)
}
