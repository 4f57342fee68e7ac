import { crownWash, lightFrom, litShade } from '@/scene/frame/manner'
import { float, partTable, view } from './common'
import { hangHatch, hatchInk } from './hatch'

/** The triangles again, in two flat tones by facing, hatched where they are cut. */
export const facesVertex = /* glsl */ `
${view}${partTable}${hangHatch}
in vec3 position;
in vec3 normal;
in vec2 surface;
flat out vec3 facing;
flat out vec4 look;      // visibility, how far back, fill, tint
flat out int family;     // of the hatch, −1 where the face is not cut
flat out vec4 hang;
void main() {
  vec4 style = partRow(1);
  int visibility = int(style.x);
  vec4 motion = partRow(0);
  vec4 more = partRow(2);
  vec4 hatch = partRow(3);
  bool cut = surface.y >= 4.0;
  facing = turned(motion, normal);
  look = vec4(style.x, style.w, cut ? surface.y - 4.0 : surface.y, more.y);
  family = cut ? int(hatch.w) : -1;
  hang = cut ? hatchOf(motion, more.zw, hatch.xyz) : vec4(0.0);
  gl_Position = visibility == HIDDEN || visibility == GHOST
    ? nowhere
    : viewProjection * vec4(moved(motion, position), 1.0);
}
`

export const facesFragment = /* glsl */ `
${view}${hatchInk}
uniform vec3 toLight;
uniform vec3 partColour;
uniform vec3 metalColour;
uniform vec3 pencilColour;
uniform vec3 pencilWashColour;
uniform vec3 gasColour;
uniform vec3 inkColour;
flat in vec3 facing;
flat in vec4 look;
flat in int family;
flat in vec4 hang;
layout(location = 0) out vec4 colour;

void main() {
  // A hair less, so that a face right on the border falls to the side on which doubles put it.
  bool light = dot(facing, toLight) > ${float(lightFrom - 1e-4)};
  vec3 fill = light ? metalColour : partColour;
  if (look.z > 1.5) fill = mix(fill, gasColour, look.w * ${float(crownWash)});
  if (int(look.x) == LIT) fill = light ? pencilWashColour : mix(pencilWashColour, pencilColour, ${float(litShade)});
  if (family >= 0) fill = mix(fill, inkColour, hatchInk(hang, family, look.y));
  colour = vec4(fill, 1.0);
}
`
