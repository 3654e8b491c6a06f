import { computed, shallowRef } from 'vue'

export interface Done {
  readonly commandId: string
  /** What it is called: "Change 4 runs to 14/2". */
  readonly words: string
}

const depth = 100

/** What this session has done and undone, by command id: undo and redo are commands themselves. */
export function useJobHistory() {
  const done = shallowRef<readonly Done[]>([])
  const undone = shallowRef<readonly Done[]>([])
  const undoWords = computed(() => done.value.at(-1)?.words)
  const redoWords = computed(() => undone.value.at(-1)?.words)
  return { done, undone, undoWords, redoWords, record, forget, step, clear }

  /** A new edit ends the redo line. */
  function record(entry: Done) {
    done.value = [...done.value, entry].slice(-depth)
    undone.value = []
  }
  /** A command that was refused was never done. */
  function forget(commandId: string) {
    done.value = done.value.filter((each) => each.commandId !== commandId)
    undone.value = undone.value.filter((each) => each.commandId !== commandId)
  }
  /** Takes the last of one list, reverts it, and puts the revert on the other, so that it can be reverted in turn. */
  function step(direction: 'undo' | 'redo', revert: (last: Done) => string | undefined) {
    const [from, to] = direction === 'undo' ? [done, undone] : [undone, done]
    const last = from.value.at(-1)
    if (!last) return
    from.value = from.value.slice(0, -1)
    const commandId = revert(last)
    if (commandId) to.value = [...to.value, { commandId, words: last.words }].slice(-depth)
  }
  function clear() {
    done.value = []
    undone.value = []
  }
}
