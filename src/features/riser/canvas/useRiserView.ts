import { useVueFlow } from '@vue-flow/core'
import { computed, type ComputedRef } from 'vue'
import type { RiserLayout, XY } from '../layout/riserLayout.ts'

export const zoomRange = { least: 0.5, most: 4, largestFit: 1.4 } as const
const margin = 6
const narrow = 600
const readable = 0.85

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
    const { width, height } = layout.value
    const pane = dimensions.value
    const whole = Math.max(0.2, fitZoom())
    // On a phone the whole house would be too small to read: as high as the pane, and one pans.
    const zoom = pane.width < narrow && whole < readable ? Math.min(readable, Math.max(whole, (pane.height - 2 * margin) / height)) : whole
    const middle = layout.value.racks[0] ? layout.value.racks[0].x + layout.value.racks[0].w / 2 : width / 2
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
  return { viewport, dimensions, least, fit, goTo, stepZoom, toDrawing: screenToFlowCoordinate, toScreen: flowToScreenCoordinate }
}
