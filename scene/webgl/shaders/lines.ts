import {
  depthTolerance,
  farInk,
  farInsideHalf,
  farOutlineHalf,
  ghostHalf,
  ghostInk,
  insideHalf,
  narrowWidth,
  outlineHalf,
  thinnest,
  thinnestOutline,
} from '@/scene/frame/manner'
import { float, partTable, view } from './common'

/**
 * Rule 4 of the ink: a line shows where one of three pixels across it holds one of its own front faces' surfaces, near in
 * depth; or, where those are too narrow to be met, another surface of its part that is not before it; or where its very
 * pixel is behind it. A ghost is looked up among the ghosts.
 */
const visible = /* glsl */ `
uniform usampler2D ids;
uniform usampler2D ghostIds;
uvec4 texelAt(vec2 pixel, bool ghost) {
  ivec2 at = clamp(ivec2(floor(pixel)), ivec2(0), ivec2(sheet) - 1);
  return ghost ? texelFetch(ghostIds, at, 0) : texelFetch(ids, at, 0);
}
bool own(vec2 pixel, float depth, vec3 surfaces, bool ghost) {
  uvec4 texel = texelAt(pixel, ghost);
  float surface = float(texel.x);
  float ahead = float(texel.z) / 65535.0 - depth;
  if (surface == surfaces.x || surface == surfaces.y) return abs(ahead) < ${float(depthTolerance)};
  return float(texel.w) == surfaces.z && ahead < 0.0;
}
bool shows(vec2 pixel, vec2 line, float depth, vec3 surfaces, bool ghost) {
  if (float(texelAt(pixel, ghost).z) / 65535.0 < depth - 1.0 / 65535.0) return true;
  vec2 across = abs(line.x) >= abs(line.y) ? vec2(0.0, 1.0) : vec2(1.0, 0.0);
  return own(pixel, depth, surfaces, ghost) || own(pixel + across, depth, surfaces, ghost) || own(pixel - across, depth, surfaces, ghost);
}
bool beyondBody(vec2 pixel, float body, bool ghost) {
  return pixel.x >= 0.0 && pixel.y >= 0.0 && pixel.x < sheet.x && pixel.y < sheet.y ? float(texelAt(pixel, ghost).y) != body : true;
}
`

export const linesVertex = /* glsl */ `
${view}${partTable}${visible}
in vec3 position;
in vec3 to;
in vec3 normalA;
in vec3 normalB;
in vec4 traits;          // surface a, surface b, their widths: a curved one's with a minus, foreshortened already
in float signs;          // 1 runs with face a, 2 with face b, 4 a crease
flat out vec4 segment;   // pixels
flat out vec2 depths;
flat out vec3 surfaces;  // its own front ones, and its part
flat out vec2 beyond;    // two pixels away from the face of an outline; nothing where both faces look at us
flat out vec4 ink;       // half width in pixels, strength, 1 for a ghost, body

/** How much of the line is an outline: the share of what shows of it that has another body beyond. */
float outlined(vec2 a, vec2 b, float body) {
  float seen = 0.0, other = 0.0;
  for (int i = 0; i < 5; i++) {
    float t = (float(i) + 0.5) / 5.0;
    vec2 at = mix(a, b, t);
    if (!shows(at, b - a, mix(depths.x, depths.y, t), surfaces, false)) continue;
    seen++;
    if (beyondBody(at + beyond, body, false)) other++;
  }
  return seen > 0.0 ? other / seen : 0.0;
}

float seenWidth(float width, float cosine) { return width < 0.0 ? -width : width * cosine; }

void main() {
  gl_Position = nowhere;
  vec4 style = partRow(1);
  int visibility = int(style.x);
  if (visibility == HIDDEN) return;

  vec4 motion = partRow(0);
  vec3 from = moved(motion, position);
  vec3 till = moved(motion, to);
  vec3 toEye = normalize(eye - from);
  int sign = int(signs);
  float cosA = dot(turned(motion, normalA), toEye);
  float cosB = dot(turned(motion, normalB), toEye);
  bool frontA = cosA > 0.0;
  bool frontB = traits.y >= 0.0 && cosB > 0.0;
  bool both = frontA && frontB;
  bool crease = sign >= 4;
  bool ghost = visibility == GHOST;
  if (crease ? !(frontA || frontB) : frontA == frontB) return;
  if (ghost && both) return;

  vec4 clipA = viewProjection * vec4(from, 1.0);
  vec4 clipB = viewProjection * vec4(till, 1.0);
  vec2 a = pixelOf(clipA);
  vec2 b = pixelOf(clipB);
  float len = distance(a, b);
  vec2 along = len > 1e-4 ? (b - a) / len : vec2(1.0, 0.0);
  vec2 left = vec2(-along.y, along.x);

  // A face that looks at us lies to the left of the edges that run with it.
  bool runsWith = frontA ? (sign & 1) != 0 : (sign & 2) != 0;
  beyond = both ? vec2(0.0) : left * (runsWith ? -2.0 : 2.0) * ratio;
  segment = vec4(a, b);
  depths = vec2(depthOf(clipA.w), depthOf(clipB.w));
  float first = partRow(2).x;
  surfaces = vec3(frontA ? first + traits.x : -1.0, frontB ? first + traits.y : -1.0, part + 1.0);

  if (ghost) {
    ink = vec4(${float(ghostHalf)} * ratio, ${float(ghostInk)}, 1.0, style.z);
  } else {
    float outline = both ? 0.0 : outlined(a, b, style.z);
    float perMetre = length(vec3(viewProjection[0][1], viewProjection[1][1], viewProjection[2][1])) * 0.5 * sheet.y / clipA.w;
    // Crowded lines have narrow surfaces on both sides; beside a wide one a line has room.
    float widthA = frontA ? seenWidth(traits.z, cosA) : 0.0;
    float widthB = frontB ? seenWidth(traits.w, cosB) : 0.0;
    float narrow = max(widthA, widthB) * perMetre / (${float(narrowWidth)} * ratio);
    float outside = mix(${float(outlineHalf)}, ${float(farOutlineHalf)}, style.w) * clamp(narrow, ${float(thinnestOutline)}, 1.0);
    float inside = mix(${float(insideHalf)}, ${float(farInsideHalf)}, style.w) * clamp(narrow, ${float(thinnest)}, 1.0);
    ink = vec4(mix(inside, outside, outline) * ratio, mix(1.0, ${float(farInk)}, style.w), 0.0, style.z);
  }

  int corner = gl_VertexID & 3;
  float reach = max(0.5, ink.x) + 1.0;
  vec2 at = (corner & 2) == 0 ? a - along * reach : b + along * reach;
  at += left * ((corner & 1) == 0 ? -reach : reach);
  gl_Position = vec4(at / sheet * 2.0 - 1.0, 0.0, 1.0);
}
`

/** Coverage, laid over one another by maximum, since adding makes dots at joints. Thinner than a pixel, a line is paler instead. */
export const linesFragment = /* glsl */ `
${view}${visible}
flat in vec4 segment;
flat in vec2 depths;
flat in vec3 surfaces;
flat in vec2 beyond;
flat in vec4 ink;
layout(location = 0) out vec4 coverage;

/**
 * In a run of ink? Thirteen pixels along the line as bits: gaps of two are closed by growing and shrinking the set ones,
 * and the middle one must then stand in a run of four, or it is a fleck.
 */
bool inRun(vec2 at, vec2 line, float depth, bool ghost) {
  vec2 step = normalize(line) * ratio;
  int bits = 0;
  for (int i = -6; i <= 6; i++) if (shows(at + step * float(i), line, depth, surfaces, ghost)) bits |= 1 << (i + 6);
  int grown = bits | (bits << 1) | (bits >> 1);
  int closed = grown & (grown << 1) & (grown >> 1);
  for (int from = 3; from <= 6; from++) if (((closed >> from) & 15) == 15) return true;
  return false;
}

void main() {
  vec2 line = segment.zw - segment.xy;
  float square = max(dot(line, line), 1e-8);
  float t = clamp(dot(gl_FragCoord.xy - segment.xy, line) / square, 0.0, 1.0);
  vec2 at = segment.xy + line * t;
  float covered = clamp(max(0.5, ink.x) + 0.5 - distance(gl_FragCoord.xy, at), 0.0, 1.0) * min(1.0, 2.0 * ink.x);
  if (covered <= 0.0) discard;
  bool ghost = ink.z > 0.5;
  float depth = mix(depths.x, depths.y, t);
  if (!inRun(at, line, depth, ghost)) discard;
  if (ghost && (!beyondBody(at + beyond, ink.w, true) || float(texelAt(at, false).z) / 65535.0 > depth)) discard;
  coverage = vec4(covered * ink.y);
}
`
