import { existsSync, readFileSync, readdirSync, readlinkSync, realpathSync } from 'node:fs'
import { basename, join } from 'node:path'
import { beganAt, stopGroup, until } from './processes.mjs'

const commandOf = (pid) => {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0')
  } catch {
    return []
  }
}

/** Processes of a server that work in these files: when it is killed, its children may outlive it. */
function atWorkIn(cluster) {
  const folder = realpathSync(cluster)
  return readdirSync('/proc').filter((name) => {
    if (!/^\d+$/.test(name)) return false
    try {
      const program = basename(readlinkSync(`/proc/${name}/exe`)).replace(' (deleted)', '')
      return program === 'postgres' && readlinkSync(`/proc/${name}/cwd`) === folder && beganAt(name) !== null
    } catch {
      return false
    }
  })
}

/** Children of a server that is gone keep the next one out: they are told to end, and waited for as long as it takes. */
async function stopOrphans(cluster) {
  const orphans = atWorkIn(cluster)
  if (orphans.length === 0) return
  console.log(`Waiting for ${orphans.length} processes that a killed database server has left at work …`)
  for (const pid of orphans) tell(Number(pid), 'SIGQUIT')
  await until(() => atWorkIn(cluster).length === 0, Infinity)
}

function tell(pid, signal) {
  try {
    process.kill(pid, signal)
  } catch (error) {
    if (error.code !== 'ESRCH') throw error
  }
}

/** Stops a server that an earlier start, killed hard, has left running on these files. */
export async function stopLeftover(cluster) {
  const pidFile = join(cluster, 'postmaster.pid')
  if (!existsSync(pidFile)) return
  const pid = Number.parseInt(readFileSync(pidFile, 'utf8'), 10)
  // the number may belong to somebody else by now
  if (pid > 0 && commandOf(pid).includes(cluster)) {
    await stopGroup({ pid, began: beganAt(pid), stopSignal: 'SIGINT' })
  }
  await stopOrphans(cluster)
}
