/** One triangle over the whole sheet that lays the ink on the faces. */
export const composeVertex = /* glsl */ `
precision highp float;
in vec3 position;
void main() { gl_Position = vec4(position.xy, 0.0, 1.0); }
`

export const composeFragment = /* glsl */ `
precision highp float;
uniform sampler2D coverage;
uniform vec3 inkColour;
layout(location = 0) out vec4 colour;
void main() {
  float covered = texelFetch(coverage, ivec2(gl_FragCoord.xy), 0).r;
  if (covered <= 0.0) discard;
  colour = vec4(inkColour, covered);
}
`
