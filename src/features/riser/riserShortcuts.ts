import type { Shortcut } from '../../app/shortcuts.ts'
import type { useSelectionStore } from '../job/selectionStore.ts'
import type { DialogKind, useRiserStore } from './riserStore.ts'
import type { useRiserEdits } from './useRiserEdits.ts'
import type { useRiserWalk } from './useRiserWalk.ts'

interface Hands {
  readonly canDesign: boolean
  readonly riser: ReturnType<typeof useRiserStore>
  readonly selection: ReturnType<typeof useSelectionStore>
  readonly edits: ReturnType<typeof useRiserEdits>
  readonly walk: ReturnType<typeof useRiserWalk>
  readonly view: { fit: (duration?: number) => void; stepZoom: (by: number) => void; focus: () => void } | null
}

/** Every key of the riser, with what it is called. Undo, find and the list of keys belong to the whole job. */
export function riserShortcuts({ canDesign, riser, selection, edits, walk, view }: Hands): Shortcut[] {
  // A form that is open has the keys for itself.
  if (riser.dialog) return []
  const some = () => onDrawing() && selection.items.length > 0
  const mayEdit = () => canDesign && some()
  const open = (dialog: DialogKind) => () => (riser.dialog = dialog)
  return [
    { keys: 'F', label: 'Fit the house', run: () => view?.fit(160) },
    { keys: '+', label: 'Closer', run: () => view?.stepZoom(1.25) },
    { keys: '=', label: 'Closer', run: () => view?.stepZoom(1.25) },
    { keys: '-', label: 'Farther', run: () => view?.stepZoom(0.8) },
    { keys: 'ArrowRight', label: 'Next run along the trunk', run: () => walk.step(1), can: onDrawing },
    { keys: 'ArrowLeft', label: 'Run before it', run: () => walk.step(-1), can: onDrawing },
    { keys: 'ArrowUp', label: 'Trunk of the level above', run: () => walk.change(-1), can: onDrawing },
    { keys: 'ArrowDown', label: 'Trunk of the level below', run: () => walk.change(1), can: onDrawing },
    { keys: 'Enter', label: 'Open the inspector', run: () => openInspector(riser), can: some },
    { keys: 'Escape', label: 'Put the tool down, then choose nothing', run: () => escape(riser, selection, view) },
    { keys: 'Delete', label: 'Delete what is chosen', run: edits.askRemove, can: mayEdit },
    { keys: 'Backspace', label: 'Delete what is chosen', run: edits.askRemove, can: mayEdit },
    { keys: 'Ctrl+D', label: 'Duplicate plates with their runs', run: edits.duplicate, can: mayEdit },
    { keys: 'Ctrl+A', label: 'Choose every run', run: () => edits.chooseAll(), can: () => true },
    { keys: 'L', label: 'Add a level', run: open('level'), can: () => canDesign },
    { keys: 'R', label: 'Add a room', run: open('room'), can: () => canDesign },
    { keys: 'T', label: 'Tags: label, cable, length', run: () => (riser.tagMode = ({ label: 'cable', cable: 'length', length: 'label' } as const)[riser.tagMode]) },
  ]
}

/** Whether keys are meant for the drawing: nothing has the focus, or the drawing has. */
function onDrawing(): boolean {
  const { activeElement } = document
  return !activeElement || activeElement === document.body || activeElement.closest('.riser-canvas') !== null
}

function openInspector(riser: Hands['riser']): void {
  riser.isInspectorOpen = true
  requestAnimationFrame(() => document.querySelector<HTMLElement>('[data-inspector-start]')?.focus())
}

function escape(riser: Hands['riser'], selection: Hands['selection'], view: Hands['view']): void {
  if (riser.tool.kind !== 'select') riser.putDown()
  else selection.clear()
  view?.focus()
}
