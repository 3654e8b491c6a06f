import { computed, ref, shallowRef } from 'vue'
import type { RefusedCommand } from '../../../shared/api/jobs.ts'
import type { Command } from '../../../shared/commands/index.ts'
import type { ConflictDetails } from '../../../shared/sync/conflict.ts'
import type { Kept, OutboxDisk } from '../../api/outboxDisk.ts'

/** A command that the server would not take: kept with its words until somebody has seen it. */
export interface Refused {
  readonly command: Command
  readonly words: string
  readonly message: string
  /** Both values, where somebody else had written the same field. */
  readonly conflict: ConflictDetails | null
}

/** What waits for the server and what it refused, here and on the disk. */
export function useJobOutbox() {
  const waiting = shallowRef<readonly Kept[]>([])
  const refusals = shallowRef<readonly Kept[]>([])
  const commands = computed(() => waiting.value.map((kept) => kept.command))
  const refused = computed(() => refusals.value.map(asRefused))
  /** False: a reload would lose what waits. */
  const isSafe = ref(true)
  /** Commands on this device that another version of the program wrote. */
  const unreadable = ref(0)
  /** Refused commands, and undos of them, by the command they go back to. */
  const roots = new Map<string, Kept>()
  let disk: OutboxDisk | undefined

  return { waiting, commands, refused, isSafe, unreadable, begin, add, settle, dismiss, end }

  /** Reads what is left from before. What another page leaves behind when it goes comes in later, and is then told. */
  async function begin(given: OutboxDisk | undefined, onMore: (kept: readonly Kept[]) => void): Promise<void> {
    end()
    disk = given
    if (!given) return
    try {
      const loaded = await given.load((kept) => {
        if (disk !== given) return
        take(kept)
        onMore(kept)
      })
      if (disk !== given) return
      unreadable.value = loaded.unreadable
      take(loaded.kept)
    } catch {
      isSafe.value = false
    }
  }
  function take(kept: readonly Kept[]) {
    const here = new Set([...waiting.value, ...refusals.value].map((each) => each.command.id))
    const more = kept.filter((each) => !here.has(each.command.id))
    // They were made before whatever has been done here since.
    waiting.value = [...more.filter((each) => !each.refusal), ...waiting.value]
    refusals.value = [...refusals.value, ...more.filter((each) => each.refusal)]
    for (const each of refusals.value) roots.set(each.command.id, each)
  }

  function add(kept: Kept) {
    waiting.value = [...waiting.value, kept]
    onDisk((at) => at.add(kept))
  }
  /** Takes out what the server has decided on. Returns what it refused. */
  function settle(accepted: readonly string[], refusedNow: readonly RefusedCommand[]): readonly Kept[] {
    const reasons = new Map(refusedNow.map((each) => [each.commandId, each]))
    const gone = new Set([...accepted, ...reasons.keys()])
    const turnedDown = waiting.value.filter((kept) => reasons.has(kept.command.id))
    waiting.value = waiting.value.filter((kept) => !gone.has(kept.command.id))
    onDisk((at) => at.remove([...gone]))
    for (const kept of turnedDown) {
      const { code, message, details } = reasons.get(kept.command.id)!
      refuse({ ...kept, refusal: { code, message, details } })
    }
    return turnedDown
  }
  /** What was refused and undone since came to nothing either way, so nobody need be told; redone, it is told after all. */
  function refuse(kept: Kept) {
    const { command } = kept
    const root = command.verb === 'revert' ? roots.get(command.args.commandId) : undefined
    roots.set(command.id, root ?? kept)
    if (root && refusals.value.includes(root)) dismiss(root.command.id)
    else {
      refusals.value = [...refusals.value, root ?? kept]
      onDisk((at) => at.add(root ?? kept))
    }
  }
  /** Somebody has seen a refusal, or it no longer matters. */
  function dismiss(commandId: string) {
    refusals.value = refusals.value.filter((kept) => kept.command.id !== commandId)
    onDisk((at) => at.remove([commandId]))
  }
  function end() {
    disk?.close()
    disk = undefined
    waiting.value = []
    refusals.value = []
    isSafe.value = true
    unreadable.value = 0
    roots.clear()
  }
  function onDisk(work: (at: OutboxDisk) => Promise<void>) {
    if (disk) void work(disk).catch(() => (isSafe.value = false))
  }
}

function asRefused({ command, words, refusal }: Kept): Refused {
  const { code, message, details } = refusal!
  return { command, words, message, conflict: code === 'conflict' && isConflict(details) ? details : null }
}

const isConflict = (details: unknown): details is ConflictDetails => typeof details === 'object' && details !== null && 'theirs' in details && 'field' in details
