import { useVueFlow } from '@vue-flow/core'
import { computed, type ComputedRef } from 'vue'
import type { RiserLayout, XY } from '../layout/riserLayout.ts'

export const zoomRange = { least: 0.5, most: 4, largestFit: 1.4 } as const
const margin = 6
const narrow = 600
/** Tags are shown from the least on; where they would not be, one begins at the wanted zoom. */
export const readable = { least: 0.76, wanted: 0.88 } as const

/** Where one looks: fit, go to a point, zoom by a step. */
export function useRiserView(layout: ComputedRef<RiserLayout>) {
  const { viewport, dimensions, setViewport, zoomTo, screenToFlowCoordinate, flowToScreenCoordinate } = useVueFlow('riser')
  const least = computed(() => Math.min(zoomRange.least, fitZoom()))

  function fitZoom(): number {
    const { width, height } = layout.value
    return Math.min((dimensions.value.width - 2 * margin) / width, (dimensions.value.height - 2 * margin) / height, zoomRange.largestFit)
  }
  /** The whole house and a little air. */
  function fit(duration = 0) {
    look(Math.max(0.2, fitZoom()), duration)
  }
  /** The first look: the whole house, or as much of it round the rack as can be read. A large job is read by its counts. */
  function start() {
    const whole = Math.max(0.2, fitZoom())
    const { width, height } = dimensions.value
    const byHeight = (height - 2 * margin) / layout.value.height
    const isFine = whole >= readable.least || (layout.value.isLarge && width >= narrow)
    look(isFine ? whole : Math.min(readable.wanted, Math.max(whole, byHeight)), 0)
  }
  function look(zoom: number, duration: number) {
    const pane = dimensions.value
    if (!pane.width) return
    const { width, height, racks } = layout.value
    const middle = racks[0] ? racks[0].x + racks[0].w / 2 : width / 2
    const x = width * zoom <= pane.width ? (pane.width - width * zoom) / 2 : Math.min(margin, Math.max(pane.width - width * zoom - margin, pane.width / 2 - middle * zoom))
    void setViewport({ x, y: Math.max(margin / 4, (pane.height - height * zoom) / 2), zoom }, { duration })
  }
  /** Brings a point into view, and no more than that where it is there already. */
  function goTo(at: XY, duration = 160) {
    const { x, y, zoom } = viewport.value
    const screen = { x: at.x * zoom + x, y: at.y * zoom + y }
    const { width, height } = dimensions.value
    const edge = 60
    if (screen.x > edge && screen.x < width - edge && screen.y > edge && screen.y < height - edge) return
    void setViewport({ x: width / 2 - at.x * zoom, y: height / 2 - at.y * zoom, zoom }, { duration })
  }
  const stepZoom = (by: number) => void zoomTo(Math.min(zoomRange.most, Math.max(least.value, viewport.value.zoom * by)), { duration: 120 })
  return { viewport, dimensions, least, start, fit, goTo, stepZoom, toDrawing: screenToFlowCoordinate, toScreen: flowToScreenCoordinate }
}
