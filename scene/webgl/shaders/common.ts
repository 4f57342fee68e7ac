/** What every pass is told of the view. */
export const view = /* glsl */ `
precision highp float;
precision highp int;
precision highp usampler2D;
uniform mat4 viewProjection;
uniform vec3 eye;
uniform vec2 sheet;      // pixels of the target
uniform vec2 depthFit;   // 1/w of the farthest and of the nearest corner
uniform float ratio;     // pixels of the target per CSS pixel
const int HIDDEN = 0, GHOST = 2, LIT = 3;
`

/** What a vertex learns of its part: see part-table.ts. */
export const partTable = /* glsl */ `
uniform sampler2D parts;
in float part;
vec4 partRow(int row) { return texelFetch(parts, ivec2(int(part), row), 0); }
vec3 turned(vec4 motion, vec3 p) { return vec3(motion.x * p.x - motion.y * p.y, motion.y * p.x + motion.x * p.y, p.z); }
vec3 moved(vec4 motion, vec3 p) { return turned(motion, p) + vec3(motion.zw, 0.0); }
float depthOf(float w) { return clamp((1.0 / w - depthFit.x) / (depthFit.y - depthFit.x), 0.0, 1.0); }
vec2 pixelOf(vec4 clip) { return (clip.xy / clip.w * 0.5 + 0.5) * sheet; }
const vec4 nowhere = vec4(2.0, 2.0, 2.0, 1.0);
`
/** A GLSL literal. */
export const float = (value: number): string => value.toFixed(6)
