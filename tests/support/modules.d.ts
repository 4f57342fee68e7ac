declare module 'gltf-validator' {
  interface Report {
    issues: {
      numErrors: number
      numWarnings: number
      messages: { code: string; message: string; severity: number; pointer?: string }[]
    }
    info: { totalTriangleCount: number; totalVertexCount: number }
  }
  export function validateBytes(
    bytes: Uint8Array,
    options?: { format?: 'glb' | 'gltf'; maxIssues?: number },
  ): Promise<Report>
}
