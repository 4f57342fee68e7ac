'use client'

import { useMemo } from 'react'
import useSWR, { useSWRConfig } from 'swr'
import { usePages } from '@/components/ui/use-pages'
import { addressOf, call, readAddress, Refusal } from '@/lib/contracts/call'
import type { AnswerOf, OperationContract } from '@/lib/contracts/operation'
import type {
  changeNote,
  deletePost,
  editPost,
  listNotes,
  makeNote,
  moveNote,
  Note,
  NoteKind,
  NoteState,
  readNote,
  reopenNote,
  replyToNote,
  settleNote,
} from '@/lib/contracts/notes'

const listPath = '/api/v1/scenes/{id}/notes'
const notePath = `${listPath}/{number}`

export interface NoteChoice {
  state: NoteState | 'all'
  kind: NoteKind | ''
  author: string
  part: string
  madeOn: number | ''
}

export const everyNote: NoteChoice = { state: 'all', kind: '', author: '', part: '', madeOn: '' }

type Page = AnswerOf<typeof listNotes>
const many = 200

/** The notes that match, as they stand in a version, with the counts of all that do. */
export function useNoteList(sceneId: string, version: number, choice: NoteChoice) {
  const { state, ...rest } = choice
  const query = { version, limit: many, ...rest, state: state === 'all' ? undefined : state }
  const { pages, error, loading, more, refresh } = usePages<Page>(
    (after) => addressOf(listPath, { id: sceneId }, { ...query, after }),
    readAddress,
  )
  // what stands beside the choice of states counts all states of whatever else is chosen
  const counted = useSWR<Page, Error>(
    addressOf(listPath, { id: sceneId }, { ...query, state: undefined, limit: 1 }),
    readAddress,
    { keepPreviousData: true },
  )
  const notes = useMemo(() => pages?.flatMap((page) => page.notes) ?? [], [pages])
  return {
    notes,
    counts: counted.data?.counts ?? null,
    authors: pages?.[0]?.authors ?? [],
    ...{ loading, error, more },
    refresh: () => void refresh(),
  }
}

/** One note with its thread; null asks for none. */
export function useNote(sceneId: string, version: number, number: number | null) {
  const key = number === null ? null : addressOf(notePath, { id: sceneId, number }, { version })
  const { data, error } = useSWR<AnswerOf<typeof readNote>, Error>(key, readAddress)
  return { note: data?.note ?? null, error }
}

type Body<O extends OperationContract> = Parameters<typeof call<O>>[0]['body']

/** What can be done to notes. Each answer is shown at once; whatever else of the scene hangs on notes is read anew. */
export function useNoteActions(sceneId: string, version: number, onChange: () => void) {
  const { mutate } = useSWRConfig()
  const refresh = () => {
    onChange()
    void mutate((key) => typeof key === 'string' && key.startsWith(`/api/v1/scenes/${sceneId}/`))
  }
  const show = async ({ note }: { note: Note }) => {
    const key = addressOf(notePath, { id: sceneId, number: note.number }, { version })
    await mutate(key, { note }, { revalidate: false })
    refresh()
    return note
  }
  const at = (number: number) => ({ id: sceneId, number })
  /** Somebody was there first: what they did is shown, and the refusal goes on to whoever asked. */
  const orSee = async (asked: Promise<{ note: Note }>) => {
    try {
      return await show(await asked)
    } catch (problem) {
      if (problem instanceof Refusal && problem.status === 409) refresh()
      throw problem
    }
  }
  return {
    make: (body: Body<typeof makeNote>, key: string) =>
      orSee(call<typeof makeNote>({ method: 'POST', path: listPath, params: { id: sceneId }, body, key })),
    reply: (number: number, body: Body<typeof replyToNote>, key: string) =>
      orSee(
        call<typeof replyToNote>({
          ...{ method: 'POST', path: `${notePath}/posts`, body, key },
          params: at(number),
        }),
      ),
    edit: (number: number, post: number, body: Body<typeof editPost>) =>
      orSee(
        call<typeof editPost>({
          ...{ method: 'PATCH', path: `${notePath}/posts/{post}`, body },
          params: { ...at(number), post },
        }),
      ),
    remove: (number: number, post: number) =>
      orSee(
        call<typeof deletePost>({
          ...{ method: 'DELETE', path: `${notePath}/posts/{post}` },
          params: { ...at(number), post },
        }),
      ),
    change: (number: number, body: Body<typeof changeNote>) =>
      orSee(call<typeof changeNote>({ method: 'PATCH', path: notePath, params: at(number), body })),
    settle: (number: number, body: Body<typeof settleNote>) =>
      orSee(
        call<typeof settleNote>({ method: 'POST', path: `${notePath}/settle`, params: at(number), body }),
      ),
    reopen: (number: number, body: Body<typeof reopenNote>) =>
      orSee(
        call<typeof reopenNote>({ method: 'POST', path: `${notePath}/reopen`, params: at(number), body }),
      ),
    move: (number: number, body: Body<typeof moveNote>) =>
      orSee(call<typeof moveNote>({ method: 'POST', path: `${notePath}/move`, params: at(number), body })),
  }
}
export type NoteActions = ReturnType<typeof useNoteActions>
