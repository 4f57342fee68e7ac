import type { SearchMessage } from './run-search'

/** The worker's end of `runSearch`: the one line of a search's own worker entry. */
export function serveSearch<Request, Answer, Progress = number>(
  search: (request: Request, onProgress: (progress: Progress) => void) => Answer,
) {
  const tell = (message: SearchMessage<Answer, Progress>) => self.postMessage(message)
  self.onmessage = ({ data }: MessageEvent<Request>) =>
    tell({ kind: 'answer', answer: search(data, (progress) => tell({ kind: 'progress', progress })) })
}
