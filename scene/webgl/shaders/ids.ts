import { partTable, view } from './common'

/** What stands in each pixel: surface, body, depth in 16 bits of fitted 1/w, part. Ghosts have a target of their own. */
export const idsVertex = /* glsl */ `
${view}${partTable}
in vec3 position;
in vec2 surface;
uniform bool ghosts;
flat out uvec3 ids;
void main() {
  vec4 style = partRow(1);
  int visibility = int(style.x);
  ids = uvec3(partRow(2).x + surface.x, style.z, part + 1.0);
  gl_Position = visibility == HIDDEN || (visibility == GHOST) != ghosts
    ? nowhere
    : viewProjection * vec4(moved(partRow(0), position), 1.0);
}
`

export const idsFragment = /* glsl */ `
${view}
flat in uvec3 ids;
layout(location = 0) out uvec4 texel;
void main() {
  float depth = clamp((gl_FragCoord.w - depthFit.x) / (depthFit.y - depthFit.x), 0.0, 1.0);
  texel = uvec4(ids.x, ids.y, uint(depth * 65535.0 + 0.5), ids.z);
}
`
