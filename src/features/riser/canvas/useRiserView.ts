import { useVueFlow } from '@vue-flow/core'
import { computed, type ComputedRef } from 'vue'
import type { RiserLayout, XY } from '../layout/riserLayout.ts'

export const zoomRange = { least: 0.5, most: 4, largestFit: 1.4 } as const
const margin = 6

/** Where one looks: fit, go to a point, zoom by a step. */
export function useRiserView(layout: ComputedRef<RiserLayout>) {
  const { viewport, dimensions, setViewport, zoomTo, screenToFlowCoordinate, flowToScreenCoordinate } = useVueFlow('riser')
  const least = computed(() => Math.min(zoomRange.least, fitZoom()))

  function fitZoom(): number {
    const { width, height } = layout.value
    return Math.min((dimensions.value.width - 2 * margin) / width, (dimensions.value.height - 2 * margin) / height, zoomRange.largestFit)
  }
  /** The house and a little air; a drawing too wide for the pane begins at its left edge. */
  function fit(duration = 0) {
    if (!dimensions.value.width) return
    const zoom = Math.max(0.2, fitZoom())
    const { width, height } = layout.value
    const x = Math.max(margin, (dimensions.value.width - width * zoom) / 2)
    void setViewport({ x, y: Math.max(margin / 4, (dimensions.value.height - height * zoom) / 2), zoom }, { duration })
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
  return { viewport, dimensions, least, fit, goTo, stepZoom, toDrawing: screenToFlowCoordinate, toScreen: flowToScreenCoordinate }
}
