/** Worker → page: how far the search is, then its answer. */
export type SearchMessage<Answer, Progress> =
  { kind: 'progress'; progress: Progress } | { kind: 'answer'; answer: Answer }

export interface SearchControl<Progress> {
  onProgress?: (progress: Progress) => void
  signal?: AbortSignal
}

/**
 * Hands one request to a worker made for it (whose entry calls `serveSearch`) and waits for its answer. The worker ends
 * with the search: answered, failed or cancelled; a cancelled one rejects with the signal's reason.
 */
export function runSearch<Request, Answer, Progress = number>(
  worker: Worker,
  request: Request,
  { onProgress, signal }: SearchControl<Progress> = {},
): Promise<Answer> {
  return new Promise<Answer>((resolve, reject) => {
    const end = () => {
      worker.terminate()
      signal?.removeEventListener('abort', cancel)
    }
    const cancel = () => {
      end()
      reject(signal?.reason)
    }
    worker.onmessage = ({ data }: MessageEvent<SearchMessage<Answer, Progress>>) => {
      if (data.kind === 'progress') return onProgress?.(data.progress)
      end()
      resolve(data.answer)
    }
    worker.onerror = (event) => {
      end()
      reject(new Error(event.message || 'The search could not run.'))
    }
    if (signal?.aborted) return cancel()
    signal?.addEventListener('abort', cancel)
    worker.postMessage(request)
  })
}
