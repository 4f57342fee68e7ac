import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { beganAt, stopGroup } from './processes.mjs'

const commandOf = (pid) => {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0')
  } catch {
    return []
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
}
