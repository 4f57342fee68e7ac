import {
  CustomBlending,
  DoubleSide,
  FrontSide,
  GLSL3,
  MaxEquation,
  NoBlending,
  NormalBlending,
  OneFactor,
  RawShaderMaterial,
} from 'three'
import type { Drawing } from './drawing'
import { composeFragment, composeVertex } from './shaders/compose'
import { facesFragment, facesVertex } from './shaders/faces'
import { idsFragment, idsVertex } from './shaders/ids'
import { linesFragment, linesVertex } from './shaders/lines'

export interface Materials {
  ids: RawShaderMaterial
  faces: RawShaderMaterial
  lines: RawShaderMaterial
  compose: RawShaderMaterial
}

export function createMaterials({ uniforms }: Drawing): Materials {
  const solid = { glslVersion: GLSL3, uniforms, side: FrontSide, blending: NoBlending }
  const flat = { glslVersion: GLSL3, uniforms, depthTest: false, depthWrite: false, transparent: true }
  return {
    ids: new RawShaderMaterial({ ...solid, vertexShader: idsVertex, fragmentShader: idsFragment }),
    faces: new RawShaderMaterial({ ...solid, vertexShader: facesVertex, fragmentShader: facesFragment }),
    lines: new RawShaderMaterial({
      ...flat,
      side: DoubleSide,
      vertexShader: linesVertex,
      fragmentShader: linesFragment,
      blending: CustomBlending,
      blendEquation: MaxEquation,
      blendSrc: OneFactor,
      blendDst: OneFactor,
    }),
    compose: new RawShaderMaterial({
      ...flat,
      vertexShader: composeVertex,
      fragmentShader: composeFragment,
      blending: NormalBlending,
    }),
  }
}
