import type { Task } from './use-task'

/** How far a file is: at work with the way to stop it, done, or refused with what to do. */
export function TaskWords({ task: { state, stop } }: { task: Task }) {
  return (
    <p className={state.at === 'refused' ? 'paper-state refused' : 'paper-state'} role="status">
      {state.at === 'work' ? (
        <>
          {state.words}{' '}
          <button type="button" className="btn sm" onClick={stop}>
            Stop
          </button>
        </>
      ) : state.at === 'done' ? (
        state.words
      ) : state.at === 'refused' ? (
        <>
          <b>{state.detail}</b> {state.cure}
        </>
      ) : null}
    </p>
  )
}
