import { defineStore } from 'pinia'
import { computed, ref, shallowRef, watch } from 'vue'
import type { JobMember, JobOpened, LogEntry, RefusedCommand } from '../../../shared/api/jobs.ts'
import { describe, type Actor, type Command, type Intent } from '../../../shared/commands/index.ts'
import { deriveJob, type Derived } from '../../../shared/derive/deriveJob.ts'
import { buildDocument, jobOf, type JobDocument } from '../../../shared/model/jobDocument.ts'
import { apply, isEmpty, type Change } from '../../../shared/sync/change.ts'
import { replay } from '../../../shared/sync/replay.ts'
import type { Kept, OutboxDisk } from '../../api/outboxDisk.ts'
import { sentenceOf } from '../../api/request.ts'
import type { JobApi } from './jobApi.ts'
import { sendBehind } from './sendBehind.ts'
import { startJobSync, type JobSync, type SyncTrouble } from './startJobSync.ts'
import { useJobHistory } from './useJobHistory.ts'
import { useJobOutbox } from './useJobOutbox.ts'

export interface OpenWith {
  readonly jobId: string
  readonly actor: Actor
  readonly api: JobApi
  readonly disk?: OutboxDisk
  readonly newId?: () => string
  readonly now?: () => string
}

/**
 * The open job. What a section needs: `doc` and `derived` to show, `edit(intent)` to change anything, `undo`, `redo`,
 * `undoWords` and `redoWords`, `notice` with the sentence of what was refused here, `status` while it is opened.
 * Every edit shows at once, waits in the outbox until the server has it, and is there again after a reload.
 */
export const useJobStore = defineStore('job', () => {
  const status = ref<'closed' | 'loading' | 'ready' | 'failed'>('closed')
  const fault = ref('')
  /** As the server has it, and as it is with what still waits. */
  const confirmed = shallowRef<JobDocument>(buildDocument('', 0, []))
  const doc = shallowRef<JobDocument>(confirmed.value)
  const derived = shallowRef<Derived>()
  const job = computed(() => jobOf(doc.value))
  const members = shallowRef<readonly JobMember[]>([])
  const notice = ref('')
  const trouble = ref<SyncTrouble>('none')
  const troubleText = ref('')
  const isOffline = computed(() => trouble.value === 'no answer')
  const outbox = useJobOutbox()
  const history = useJobHistory()
  /** What this session's own commands did, for undo. */
  const changes = new Map<string, Change>()
  let context: OpenWith | undefined
  let link: JobSync | undefined
  let lastHeard = 0

  watch(doc, (now) => status.value === 'ready' && (derived.value = deriveJob(now, derived.value?.doc.id === now.id ? derived.value : undefined)), { flush: 'sync' })

  return {
    status, fault, doc, derived, job, members, outbox: outbox.commands, refused: outbox.refused, isSafe: outbox.isSafe, unreadable: outbox.unreadable,
    notice, trouble, troubleText, isOffline, confirmed, undoWords: history.undoWords, redoWords: history.redoWords,
    open, close, edit, undo, redo, sync, ask, heard, dismiss, insist, memberName, newId,
  }

  /** Opens a job, with what is still waiting from before. */
  async function open(given: OpenWith): Promise<void> {
    close()
    context = given
    status.value = 'loading'
    fault.value = ''
    lastHeard = 0
    const loaded = outbox.begin(given.disk, onLeftBehind)
    try {
      const opened = await given.api.open()
      await loaded
      if (context !== given) return
      remember(outbox.waiting.value)
      confirm(opened)
      status.value = 'ready'
      rebase()
      link = startJobSync({
        api: given.api,
        version: () => confirmed.value.version,
        waiting: () => outbox.commands.value,
        take, settle, onTrouble,
        afresh: (again) => {
          confirm(again)
          rebase()
        },
      })
      link.heard(lastHeard)
      void link.sync()
    } catch (error) {
      if (context !== given) return
      status.value = 'failed'
      fault.value = sentenceOf(error)
    }
  }
  /** Leaves the job. What still waits is sent on the way out, and stays on the disk until the server has it. */
  function close() {
    if (context?.disk && link && outbox.commands.value.length) sendBehind(context.api, context.disk, confirmed.value.version, outbox.waiting.value)
    link?.stop()
    link = context = undefined
    status.value = 'closed'
    notice.value = ''
    onTrouble('none', '')
    outbox.end()
    history.clear()
    changes.clear()
    // What was shown stays until another job is there: a page that is on its way out may still read it.
  }
  function confirm(opened: JobOpened) {
    members.value = opened.members
    confirmed.value = buildDocument(context?.jobId ?? '', opened.version, opened.records)
  }

  /** The one door for every edit. Refused: a sentence in `notice`, and nothing has changed. Returns the command's id. */
  function edit(intent: Intent): string | undefined {
    const words = wordsOf(intent)
    const commandId = carryOut(intent, words)
    if (commandId) history.record({ commandId, words })
    return commandId
  }
  function undo() {
    history.step('undo', ({ commandId, words }) => carryOut(revertOf(commandId), `Undo: ${words}`))
  }
  function redo() {
    history.step('redo', ({ commandId, words }) => carryOut(revertOf(commandId), `Redo: ${words}`))
  }
  function revertOf(commandId: string): Intent {
    return { verb: 'revert', args: { commandId, at: context?.now?.() ?? new Date().toISOString() } }
  }

  function carryOut(intent: Intent, words: string): string | undefined {
    if (!context || status.value !== 'ready') return undefined
    const command = { ...intent, id: newId(), madeAt: confirmed.value.version } as Command
    const played = replay(doc.value, [command], { actor: context.actor, changeOf })
    notice.value = played.refused[0]?.error.message ?? ''
    const change = played.changes.get(command.id)
    if (!change || isEmpty(change)) return undefined
    changes.set(command.id, change)
    outbox.add({ command, words, undoes: command.verb === 'revert' ? (changeOf(command.args.commandId) ?? null) : null, refusal: null })
    doc.value = played.doc
    void sync()
    return command.id
  }
  function changeOf(commandId: string): Change | undefined {
    return changes.get(commandId)
  }

  /** Plays what is waiting over what is confirmed. */
  function rebase() {
    if (!context) return
    const played = replay(confirmed.value, outbox.commands.value, { actor: context.actor, changeOf })
    for (const [id, change] of played.changes) changes.set(id, change)
    doc.value = played.doc
  }
  /** Folds in what the server accepted, ours and everybody's. */
  function take(entries: readonly LogEntry[]) {
    let next = confirmed.value
    for (const { version, change, actorId, commandId } of entries) {
      if (version <= next.version) continue
      if (version > next.version + 1) throw new Error(`Nothing is known of version ${next.version + 1}`)
      next = { ...apply(next, change), version }
      if (actorId === context?.actor.id) changes.set(commandId, change)
    }
    confirmed.value = next
  }
  function settle(accepted: readonly string[], refusedNow: readonly RefusedCommand[]) {
    for (const { command } of outbox.settle(accepted, refusedNow)) {
      history.forget(command.id)
      changes.delete(command.id)
    }
    rebase()
  }
  function onLeftBehind(kept: readonly Kept[]) {
    remember(kept)
    rebase()
    void sync()
  }
  /** What was undone in an earlier session is known only from the disk. */
  function remember(kept: readonly Kept[]) {
    for (const { command, undoes } of kept) if (command.verb === 'revert' && undoes && !changes.has(command.args.commandId)) changes.set(command.args.commandId, undoes)
  }
  function onTrouble(next: SyncTrouble, sentence: string) {
    trouble.value = next
    troubleText.value = sentence
  }

  /** Sends what waits and takes in what others did; resolves when there is nothing left or nobody answers. */
  async function sync(): Promise<void> {
    await link?.sync()
  }
  /** Asks the server whether there is more, although nothing says so. */
  async function ask(): Promise<void> {
    await link?.ask()
  }
  /** The server says that there is more. */
  function heard(version: number) {
    lastHeard = version
    link?.heard(version)
  }
  /** Somebody has seen a refusal, and lets it be. */
  function dismiss(commandId: string) {
    outbox.dismiss(commandId)
  }
  /** Does a refused command after all, now that its author has seen the other value. What is refused again stays. */
  function insist(commandId: string) {
    const again = outbox.refused.value.find((each) => each.command.id === commandId)
    if (!again) return
    const { id: _id, madeAt: _madeAt, ...intent } = again.command
    const done = carryOut(intent as Intent, again.words)
    if (done) history.record({ commandId: done, words: again.words })
    if (done || notice.value === '') dismiss(commandId)
  }
  function wordsOf(intent: Intent): string {
    try {
      return describe(doc.value, intent)
    } catch {
      // It will be refused, with a sentence of its own.
      return intent.verb
    }
  }
  function memberName(id: string): string {
    return members.value.find((member) => member.id === id)?.name ?? 'somebody'
  }
  function newId(): string {
    return context?.newId?.() ?? crypto.randomUUID()
  }
})
