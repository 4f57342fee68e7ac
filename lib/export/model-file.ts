import { WebIO } from '@gltf-transform/core'
import { modelDocument, type ModelRequest } from './model-document'

export const modelForms = ['glb', 'gltf'] as const
export type ModelForm = (typeof modelForms)[number]

export const modelMedia: Record<ModelForm, string> = { glb: 'model/gltf-binary', gltf: 'model/gltf+json' }

/** A model as one file: binary, or JSON that carries its buffer within. */
export async function modelFile(request: ModelRequest, form: ModelForm): Promise<Uint8Array<ArrayBuffer>> {
  const document = modelDocument(request)
  const io = new WebIO()
  if (form === 'glb') return Uint8Array.from(await io.writeBinary(document))
  const { json, resources } = await io.writeJSON(document)
  for (const buffer of json.buffers ?? []) {
    const bytes = resources[buffer.uri ?? '']
    buffer.uri = `data:application/octet-stream;base64,${base64(bytes)}`
  }
  return new TextEncoder().encode(JSON.stringify(json))
}

/** A slice at a time: an argument list has a limit. */
function base64(bytes: Uint8Array): string {
  let text = ''
  for (let at = 0; at < bytes.length; at += 0x8000)
    text += String.fromCharCode(...bytes.subarray(at, at + 0x8000))
  return btoa(text)
}
