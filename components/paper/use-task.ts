import { useRef, useState } from 'react'
import { Refusal } from '@/lib/contracts/call'

export type TaskState =
  | { at: 'rest' }
  | { at: 'work'; words: string }
  | { at: 'done'; words: string }
  | { at: 'refused'; detail: string; cure: string }

/** One thing at a time that the server makes, with how far it is in words. */
export function useTask() {
  const [state, setState] = useState<TaskState>({ at: 'rest' })
  const running = useRef<AbortController | null>(null)
  const run = async (words: string, done: string, work: (signal: AbortSignal) => Promise<void>) => {
    if (running.current) return
    const control = new AbortController()
    running.current = control
    setState({ at: 'work', words })
    try {
      await work(control.signal)
      setState({ at: 'done', words: done })
    } catch (error) {
      if (control.signal.aborted) setState({ at: 'done', words: 'Stopped.' })
      else if (error instanceof Refusal)
        setState({ at: 'refused', detail: error.problem.detail, cure: error.problem.cure })
      else
        setState({
          at: 'refused',
          detail: 'The file could not be made here.',
          cure: 'Reload the page and try again.',
        })
    } finally {
      running.current = null
    }
  }
  return { state, busy: state.at === 'work', run, stop: () => running.current?.abort() }
}

export type Task = ReturnType<typeof useTask>
