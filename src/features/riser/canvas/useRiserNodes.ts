import { useVueFlow, type GraphNode, type Node } from '@vue-flow/core'
import { watch } from 'vue'
import type { RiserNode } from '../layout/toNodes.ts'

/** Keeps Vue Flow's nodes like ours, touching only those that differ: handing it all of them again costs a frame or two. */
export function useRiserNodes(wanted: () => RiserNode[], connectable: () => boolean) {
  const { addNodes, removeNodes, findNode } = useVueFlow('riser')
  const known = new Map<string, RiserNode>()
  watch([wanted, connectable], ([nodes]) => take(nodes), { immediate: true })
  return { putBack }

  function take(nodes: readonly RiserNode[]) {
    const next = new Set(nodes.map((node) => node.id))
    const gone = [...known.keys()].filter((id) => !next.has(id))
    if (gone.length) removeNodes(gone)
    for (const id of gone) known.delete(id)
    const added: Node[] = []
    for (const node of nodes) {
      const before = known.get(node.id)
      const graph = before && findNode(node.id)
      if (!graph) added.push(made(node))
      else if (before !== node) change(graph, node)
      known.set(node.id, node)
    }
    if (added.length) addNodes(added)
  }
  function made(node: RiserNode): Node {
    const { id, type, itemId, position, zIndex, draggable } = node
    return { id, type, position: { ...position }, draggable, connectable: connectable(), selectable: type !== 'bay' && type !== 'level', focusable: false, zIndex, data: { id: itemId }, style: styleOf(node) }
  }
  function change(graph: GraphNode, node: RiserNode) {
    if (graph.position.x !== node.position.x || graph.position.y !== node.position.y) graph.position = { ...node.position }
    const before = known.get(node.id)!
    if (before.size.w !== node.size.w || before.size.h !== node.size.h) graph.style = styleOf(node)
    if (graph.draggable !== node.draggable) graph.draggable = node.draggable
    if (graph.connectable !== connectable()) graph.connectable = connectable()
  }

  /** Everything where it belongs, wherever a drag has left it. */
  function putBack() {
    for (const node of known.values()) {
      const graph = findNode(node.id)
      if (graph) change(graph, node)
    }
  }
}

const styleOf = ({ size, zIndex }: RiserNode) => ({ width: `${size.w}px`, height: `${size.h}px`, zIndex: String(zIndex) })
