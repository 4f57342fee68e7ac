import { farInk, hatchHalf, hatchPitch } from '@/scene/frame/manner'
import { float } from './common'

/** Where the hatch of a part hangs on the sheet (pixels, y down) and along what it lies: it rides with the part. */
export const hangHatch = /* glsl */ `
vec2 downPixel(vec4 clip) { return vec2(clip.x / clip.w * 0.5 + 0.5, 0.5 - clip.y / clip.w * 0.5) * sheet; }
vec2 leaning(vec4 clip, vec3 axis) {
  vec4 step = viewProjection * vec4(axis, 0.0);
  return (vec2(step.x, -step.y) - vec2(clip.x, -clip.y) * step.w / clip.w) * sheet * 0.5;
}
vec4 hatchOf(vec4 motion, vec2 bore, vec3 middle) {
  vec4 clip = viewProjection * vec4(moved(motion, middle), 1.0);
  vec2 axis = bore == vec2(0.0) ? vec2(-motion.y, motion.x) : bore;
  vec2 lean = leaning(clip, vec3(axis, 0.0));
  float focal = length(vec3(viewProjection[0][1], viewProjection[1][1], viewProjection[2][1])) * 0.5 * sheet.y;
  // Looking along it, lean on the crank's direction instead.
  if (length(lean) < 0.3 * focal) lean = leaning(clip, vec3(0.0, 0.0, 1.0));
  lean = normalize(lean);
  return vec4(downPixel(clip), vec2(lean.x - lean.y, lean.x + lean.y) * 0.70710678);
}
`

/** Families by bank: A single, B paired, C broken, D crossed, E dotted, F paired broken. */
export const hatchInk = /* glsl */ `
float between(float along, float period) { return abs(fract(along / period) - 0.5) * period; }
float hatchInk(vec4 hang, int family, float far) {
  vec2 d = vec2(gl_FragCoord.x, sheet.y - gl_FragCoord.y) - hang.xy;
  float along = dot(d, hang.zw);
  float across = d.y * hang.z - d.x * hang.w;
  float pitch = ${float(hatchPitch)} * ratio;
  bool paired = family == 1 || family == 5;
  float lines = paired ? 1.6 * pitch : pitch;
  float off = between(across, pitch);
  if (paired) {
    float within = fract(across / lines) * lines;
    off = min(abs(within - 0.55 * pitch), abs(within - 1.05 * pitch));
  }
  float shift = mod(floor(across / lines), 2.0) * 0.5;
  if (family == 3) off = min(off, between(along, pitch));
  if (family == 2 || family == 5) {
    float within = fract(along / (9.0 * ratio) + shift) * 9.0 * ratio;
    if (within > 6.0 * ratio) off = length(vec2(off, min(within - 6.0 * ratio, 9.0 * ratio - within)));
  }
  if (family == 4) off = length(vec2(off, between(along + shift * 0.72 * pitch, 0.72 * pitch))) - 0.3 * ratio;
  float halfWidth = ${float(hatchHalf)} * ratio;
  return clamp(max(0.5, halfWidth) + 0.5 - off, 0.0, 1.0) * min(1.0, 2.0 * halfWidth) * mix(1.0, ${float(farInk)}, far);
}
`
