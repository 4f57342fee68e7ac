import { describe, expect, it, vi } from 'vitest'
import { runSearch } from '@/scene/session/search/run-search'

/** A worker of which the test says what it answers and when. */
function stub() {
  const worker = {
    onmessage: null as ((event: MessageEvent) => void) | null,
    onerror: null as ((event: ErrorEvent) => void) | null,
    postMessage: vi.fn(),
    terminate: vi.fn(),
  }
  const say = (data: unknown) => worker.onmessage!({ data } as MessageEvent)
  return { worker, say, asWorker: worker as unknown as Worker }
}

describe('runSearch(worker, request, { onProgress, signal })', () => {
  it('hands the request over, tells progress, resolves with the answer and ends the worker', async () => {
    const { worker, say, asWorker } = stub()
    const onProgress = vi.fn()
    const answer = runSearch<number, string>(asWorker, 7, { onProgress })
    expect(worker.postMessage).toHaveBeenCalledExactlyOnceWith(7)
    say({ kind: 'progress', progress: 256 })
    say({ kind: 'progress', progress: 512 })
    expect(worker.terminate).not.toHaveBeenCalled()
    say({ kind: 'answer', answer: 'found' })
    await expect(answer).resolves.toBe('found')
    expect(onProgress.mock.calls).toEqual([[256], [512]])
    expect(worker.terminate).toHaveBeenCalledOnce()
  })

  it('ends the worker and rejects with the signal’s reason when it is cancelled', async () => {
    const { worker, asWorker } = stub()
    const control = new AbortController()
    const answer = runSearch(asWorker, 7, { signal: control.signal })
    control.abort()
    await expect(answer).rejects.toBe(control.signal.reason)
    expect(worker.terminate).toHaveBeenCalledOnce()
  })

  it('asks nothing of a worker when it is cancelled before it begins', async () => {
    const { worker, asWorker } = stub()
    await expect(runSearch(asWorker, 7, { signal: AbortSignal.abort() })).rejects.toThrow('aborted')
    expect(worker.postMessage).not.toHaveBeenCalled()
    expect(worker.terminate).toHaveBeenCalledOnce()
  })

  it('rejects when the worker breaks', async () => {
    const { worker, asWorker } = stub()
    const answer = runSearch(asWorker, 7)
    worker.onerror!({ message: 'broken' } as ErrorEvent)
    await expect(answer).rejects.toThrow('broken')
    expect(worker.terminate).toHaveBeenCalledOnce()
  })
})
