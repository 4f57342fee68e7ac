import { spawn } from 'node:child_process'
import { readFileSync, readdirSync } from 'node:fs'
import { createServer } from 'node:net'
import { setTimeout as pause } from 'node:timers/promises'

/** A reason to end that a person can act on: shown without a stack. */
export class Refusal extends Error {}

const started = new Set()
let observer = () => {}

/** From now on told of every group that starts, as what `stopGroup` takes. */
export function observeGroups(tell) {
  observer = tell
}

/**
 * Starts a program as the leader of a process group of its own, so that all of it can be stopped;
 * `stopSignal` is the one that it takes for a polite request.
 */
export function startGroup(
  command,
  args,
  { stopSignal = 'SIGTERM', stdio = ['ignore', 'inherit', 'inherit'], ...options } = {},
) {
  const child = spawn(command, args, { detached: true, stdio, ...options })
  const group = { pid: child.pid, began: beganAt(child.pid), stopSignal }
  const ended = new Promise((resolve) => {
    child.once('exit', (code, signal) => resolve({ code, signal }))
    child.once('error', (error) => resolve({ code: null, signal: null, error }))
  }).finally(() => started.delete(group))
  if (child.pid) {
    started.add(group)
    observer(group)
  }
  return { ...group, child, ended, stop: () => stopGroup(group) }
}

/** Stops every group that is still running, the last started first. */
export async function stopEverything() {
  for (const group of [...started].reverse()) await stopGroup(group)
}

/** Runs a program to its end; throws when it fails. */
export async function run(command, args, options = {}) {
  const { code, signal, error } = await startGroup(command, args, options).ended
  if (error) throw error
  if (code !== 0) throw new Refusal(`${command} ${args.join(' ')} ended with ${signal ?? code}.`)
}

/** What the kernel says of a process that has not ended, or null. */
function processStat(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    const [state, , group, ...rest] = stat.slice(stat.lastIndexOf(')') + 2).split(' ')
    return state === 'Z' ? null : { group: Number(group), began: rest[16] }
  } catch {
    return null
  }
}

const boot = () => readFileSync('/proc/sys/kernel/random/boot_id', 'utf8').trim()

/** Which boot a process belongs to and when in it it began; with the pid that names one process for ever. Null when gone. */
export function beganAt(pid) {
  const stat = processStat(pid)
  return stat && `${boot()} ${stat.began}`
}

// asked of the kernel's list, not by a signal: a member that has ended but that nobody has waited for is no life
const groupLives = (pid) =>
  readdirSync('/proc').some((name) => /^\d+$/.test(name) && processStat(name)?.group === pid)

/** Polls until the answer is truthy and returns it; returns null when the time is over. */
export async function until(ask, milliseconds, every = 50) {
  const end = Date.now() + milliseconds
  for (;;) {
    const answer = await ask()
    if (answer) return answer
    if (Date.now() > end) return null
    await pause(every)
  }
}

function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal)
  } catch (error) {
    if (error.code !== 'ESRCH') throw error
  }
}

/** Stops a whole group politely, after 20 seconds by force. Does nothing when its number is somebody else's by now. */
export async function stopGroup({ pid, began, stopSignal }) {
  const leader = beganAt(pid)
  if (leader !== null ? leader !== began : !began?.startsWith(boot())) return
  signalGroup(pid, stopSignal)
  if (await until(() => !groupLives(pid), 20_000)) return
  signalGroup(pid, 'SIGKILL')
  await until(() => !groupLives(pid), 5_000)
}

/** True when a server could listen on 127.0.0.1 at this port now. */
export function portIsFree(port) {
  return new Promise((resolve) => {
    const probe = createServer()
    probe.once('error', () => resolve(false))
    probe.listen(port, '127.0.0.1', () => probe.close(() => resolve(true)))
  })
}

export function freePort() {
  return new Promise((resolve, reject) => {
    const probe = createServer()
    probe.once('error', reject)
    probe.listen(0, '127.0.0.1', () => {
      const { port } = probe.address()
      probe.close(() => resolve(port))
    })
  })
}
