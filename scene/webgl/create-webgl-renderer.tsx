import { advance, createRoot, flushSync } from '@react-three/fiber'
import type { Frame, Renderer, Rig, Visibility } from '@/scene/frame/types'
import { createDrawing } from './drawing'
import { Engine } from './engine'
import { createMaterials } from './materials'
import { createPartTable, type PartTable } from './part-table'

/** Pixels a CSS pixel beyond which nobody sees a gain. */
const finest = 2

/** Draws rig and pose with the graphics card; `onPainted` after each picture. Rejects where no WebGL 2 can be had. */
export async function createWebglRenderer(
  canvas: HTMLCanvasElement,
  onPainted?: () => void,
): Promise<Renderer> {
  const drawing = createDrawing()
  const materials = createMaterials(drawing)
  const root = createRoot(canvas)
  await root.configure({
    frameloop: 'never',
    dpr: 1,
    size: { width: 1, height: 1, top: 0, left: 0 },
    gl: { antialias: true, alpha: true, powerPreference: 'high-performance' },
  })
  const store = root.render(null)
  const { gl } = store.getState()
  gl.autoClear = false
  gl.setClearColor(0, 0)

  let rig: Rig | null = null
  let table: PartTable | null = null
  let visibility: Visibility | null = null
  let frames = 0

  return {
    setRig(next) {
      const nextTable = createPartTable(next)
      rig = next
      table = nextTable
      if (visibility?.length === next.parts.length) table.setVisibility(visibility)
      flushSync(() => {
        root.render(<Engine rig={next} table={nextTable} drawing={drawing} materials={materials} />)
      })
    },
    setTheme: drawing.setTheme,
    setVisibility(next) {
      visibility = Uint8Array.from(next)
      table?.setVisibility(visibility)
    },
    resize(width, height, wanted) {
      const ratio = Math.min(wanted, finest)
      const { setSize, setDpr } = store.getState()
      flushSync(() => {
        setDpr(ratio)
        setSize(width, height)
      })
      drawing.setSheet(gl.domElement.width, gl.domElement.height, ratio)
    },
    draw(frame: Frame) {
      if (!rig || !table) return true
      drawing.setView(frame, rig)
      table.write(frame)
      advance(frames++, false, store.getState())
      onPainted?.()
      return true
    },
    dispose() {
      root.unmount()
      materials.ids.dispose()
      materials.faces.dispose()
      materials.lines.dispose()
      materials.compose.dispose()
    },
  }
}
