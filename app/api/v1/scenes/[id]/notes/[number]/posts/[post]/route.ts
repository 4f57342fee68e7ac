import { deletePost as deleteContract, editPost as editContract } from '@/lib/contracts/notes'
import { handle } from '@/lib/http/handle'
import { deletePost } from '@/lib/services/notes/delete-post'
import { editPost } from '@/lib/services/notes/edit-post'

export const PATCH = handle(editContract, async ({ person, params, body }) => {
  const { id: sceneId, number, post } = params
  return { note: await editPost(person, { sceneId, number, post }, body) }
})

export const DELETE = handle(deleteContract, async ({ person, params }) => ({
  note: await deletePost(person, params.id, params.number, params.post),
}))
