import { onBeforeUnmount, onMounted } from 'vue'

/** Something that can be done, wherever it is offered: in a menu, by a button, by keys. */
export interface Shortcut {
  /** As shown: "Ctrl+Z", "/", "F". */
  readonly keys: string
  readonly label: string
  readonly run: () => void
  readonly can?: () => boolean
}

const isTyping = (target: EventTarget | null) => target instanceof HTMLElement && (target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName))

/** "Ctrl+Shift+Z" for an event; the command key counts as Ctrl. */
function keysOf(event: KeyboardEvent): string {
  const parts = [event.ctrlKey || event.metaKey ? 'Ctrl' : '', event.altKey ? 'Alt' : '', event.shiftKey && event.key.length > 1 ? 'Shift' : event.shiftKey && (event.ctrlKey || event.metaKey) ? 'Shift' : '']
  const key = event.key === ' ' ? 'Space' : event.key.length === 1 ? event.key.toUpperCase() : event.key
  return [...parts.filter(Boolean), key].join('+')
}

const listening = new Set<() => readonly Shortcut[]>()

/** What the keys do on this page now, a line for each thing: the list behind "?". */
export function shortcutsHere(): ReadonlyMap<string, readonly string[]> {
  const lines = new Map<string, string[]>()
  for (const { keys, label } of [...listening].flatMap((shortcuts) => shortcuts())) lines.set(label, [...(lines.get(label) ?? []), keys])
  return lines
}

/** Listens for these keys while the component is there. Keys without Ctrl do nothing while somebody types. */
export function useShortcuts(shortcuts: () => readonly Shortcut[]): void {
  function onKeydown(event: KeyboardEvent) {
    const keys = keysOf(event)
    if (event.defaultPrevented || (isTyping(event.target) && !(keys.startsWith('Ctrl+') && keys !== 'Ctrl+Z' && keys !== 'Ctrl+Shift+Z' && keys !== 'Ctrl+A'))) return
    const shortcut = shortcuts().find((each) => each.keys === keys && (each.can?.() ?? true))
    if (!shortcut) return
    event.preventDefault()
    shortcut.run()
  }
  onMounted(() => {
    window.addEventListener('keydown', onKeydown)
    listening.add(shortcuts)
  })
  onBeforeUnmount(() => {
    window.removeEventListener('keydown', onKeydown)
    listening.delete(shortcuts)
  })
}
