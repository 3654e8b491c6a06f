import { defineStore } from 'pinia'
import { computed, ref, shallowRef, watch } from 'vue'
import type { JobMember, LogEntry } from '../../../shared/api/jobs.ts'
import { maxCommandsPerPush } from '../../../shared/api/jobs.ts'
import { describe, type Actor, type Command, type Intent } from '../../../shared/commands/index.ts'
import { deriveJob, type Derived } from '../../../shared/derive/deriveJob.ts'
import { buildDocument, jobOf, type JobDocument } from '../../../shared/model/jobDocument.ts'
import { apply, isEmpty, type Change } from '../../../shared/sync/change.ts'
import type { ConflictDetails } from '../../../shared/sync/conflict.ts'
import { replay } from '../../../shared/sync/replay.ts'
import { ApiProblem, NoConnection, sentenceOf } from '../../api/request.ts'
import type { OutboxDisk } from '../../api/outboxDisk.ts'
import type { JobApi } from './jobApi.ts'
import { useJobHistory } from './jobHistory.ts'

/** A command that the server would not take: kept with its words until somebody has seen it. */
export interface Refused {
  readonly command: Command
  readonly words: string
  readonly message: string
  /** Both values, where somebody else had written the same field. */
  readonly conflict: ConflictDetails | null
}

export interface OpenWith {
  readonly jobId: string
  readonly actor: Actor
  readonly api: JobApi
  readonly disk?: OutboxDisk
  readonly newId?: () => string
  readonly now?: () => string
}

const firstWaitMs = 500
const longestWaitMs = 15_000

/**
 * The open job. Everything on the screen is `doc` and `derived`; every edit goes through `edit`, shows at once, waits in
 * the outbox until the server has it, and is there again after a reload.
 */
export const useJobStore = defineStore('job', () => {
  const status = ref<'closed' | 'loading' | 'ready' | 'failed'>('closed')
  const fault = ref('')
  const confirmed = shallowRef<JobDocument>(buildDocument('', 0, []))
  const shown = shallowRef<JobDocument>(confirmed.value)
  const outbox = shallowRef<readonly Command[]>([])
  const members = shallowRef<readonly JobMember[]>([])
  const notice = ref('')
  const refused = shallowRef<readonly Refused[]>([])
  const isOffline = ref(false)
  const history = useJobHistory()
  const changes = new Map<string, Change>()
  /** What each command was called when it was made: its words need the job as it then was. */
  const wordsOf = new Map<string, string>()
  let context: OpenWith | undefined
  let syncing: Promise<void> | undefined
  let retry: ReturnType<typeof setTimeout> | undefined
  let waitMs = firstWaitMs
  let known = 0

  const now = () => context?.now?.() ?? new Date().toISOString()
  const changeOf = (id: string) => changes.get(id)
  const derived = shallowRef<Derived>()
  watch(shown, (doc) => status.value === 'ready' && (derived.value = deriveJob(doc, derived.value?.doc.id === doc.id ? derived.value : undefined)), { flush: 'sync' })
  const job = computed(() => jobOf(shown.value))

  return {
    status, fault, doc: shown, derived, job, members, outbox, refused, notice, isOffline, confirmed,
    undoWords: history.undoWords, redoWords: history.redoWords,
    open, close, edit, undo, redo, sync, heard, dismiss, insist, memberName, newId,
  }

  /** Opens a job, with what is still waiting from before. */
  async function open(given: OpenWith) {
    close()
    context = given
    status.value = 'loading'
    fault.value = ''
    try {
      const opened = await given.api.open()
      if (context !== given) return
      members.value = opened.members
      confirmed.value = buildDocument(given.jobId, opened.version, opened.records)
      known = opened.version
      outbox.value = (await given.disk?.load()) ?? []
      status.value = 'ready'
      rebase()
      void sync()
    } catch (error) {
      if (context !== given) return
      status.value = 'failed'
      fault.value = sentenceOf(error)
    }
  }
  function close() {
    clearTimeout(retry)
    context = undefined
    status.value = 'closed'
    outbox.value = []
    refused.value = []
    notice.value = ''
    history.done.value = []
    history.undone.value = []
    changes.clear()
    wordsOf.clear()
    // What was shown stays until another job is there: a page that is on its way out may still read it.
  }

  function newId(): string {
    return context?.newId?.() ?? crypto.randomUUID()
  }
  /** The one door for every edit. Refused: a sentence in `notice`, and nothing has changed. Returns the command's id. */
  function edit(intent: Intent): string | undefined {
    const words = safely(() => describe(shown.value, intent)) ?? intent.verb
    const id = dispatch(intent)
    if (!id) return undefined
    wordsOf.set(id, words)
    history.record({ commandId: id, words })
    return id
  }
  function undo() {
    history.step('undo', (commandId) => dispatch({ verb: 'revert', args: { commandId, at: now() } }))
  }
  function redo() {
    history.step('redo', (commandId) => dispatch({ verb: 'revert', args: { commandId, at: now() } }))
  }

  function dispatch(intent: Intent): string | undefined {
    if (!context || status.value !== 'ready') return undefined
    const command = { ...intent, id: newId(), madeAt: confirmed.value.version } as Command
    const played = replay(shown.value, [command], { actor: context.actor, changeOf })
    const [refusal] = played.refused
    notice.value = refusal?.error.message ?? ''
    const change = played.changes.get(command.id)
    if (!change || isEmpty(change)) return undefined
    changes.set(command.id, change)
    outbox.value = [...outbox.value, command]
    shown.value = played.doc
    void context.disk?.add(command).catch(() => (notice.value = 'This device cannot keep your work while there is no connection'))
    void sync()
    return command.id
  }

  /** Plays what is waiting over what is confirmed. */
  function rebase() {
    if (!context) return
    const played = replay(confirmed.value, outbox.value, { actor: context.actor, changeOf })
    for (const [id, change] of played.changes) changes.set(id, change)
    shown.value = played.doc
  }

  /** Sends what waits and takes in what others did; one at a time, and again after a while when nobody answers. */
  function sync(): Promise<void> {
    syncing ??= run().finally(() => (syncing = undefined))
    return syncing
  }
  async function run() {
    const at = context
    clearTimeout(retry)
    try {
      while (context === at && at && (outbox.value.length || known > confirmed.value.version)) {
        const sent = outbox.value.slice(0, maxCommandsPerPush)
        if (sent.length) await push(at, sent)
        else await pull(at)
      }
      isOffline.value = false
      waitMs = firstWaitMs
    } catch (error) {
      if (context !== at) return
      if (error instanceof NoConnection) {
        isOffline.value = true
        retry = setTimeout(() => void sync(), waitMs)
        waitMs = Math.min(waitMs * 2, longestWaitMs)
      } else if (error instanceof ApiProblem && error.status !== 401) {
        notice.value = `Your work is kept here, but the server did not take it: ${error.message}`
        retry = setTimeout(() => void sync(), longestWaitMs)
      } else if (!(error instanceof ApiProblem)) throw error
    }
  }
  async function push(at: OpenWith, sent: readonly Command[]) {
    const answer = await at.api.push(confirmed.value.version, sent)
    if (context !== at) return
    const before = shown.value
    take(answer.since, answer.version)
    for (const { commandId, message, code, details } of answer.refused) {
      const command = sent.find((each) => each.id === commandId)
      if (!command) continue
      history.forget(commandId)
      changes.delete(commandId)
      refused.value = [...refused.value, { command, words: wordsOf.get(commandId) ?? safely(() => describe(before, command)) ?? command.verb, message, conflict: code === 'conflict' && isConflict(details) ? details : null }]
    }
    const settled = new Set([...answer.accepted.map((each) => each.commandId), ...answer.refused.map((each) => each.commandId)])
    outbox.value = outbox.value.filter((command) => !settled.has(command.id))
    void at.disk?.remove([...settled]).catch(() => undefined)
    rebase()
  }
  async function pull(at: OpenWith) {
    const answer = await at.api.since(confirmed.value.version)
    if (context !== at) return
    take(answer.since, answer.version)
    rebase()
  }
  /** Folds in what the server accepted, ours and everybody's. */
  function take(entries: readonly LogEntry[], version: number) {
    let next = confirmed.value
    for (const entry of entries) {
      if (entry.version <= next.version) continue
      next = { ...apply(next, entry.change), version: entry.version }
      if (entry.actorId === context?.actor.id) changes.set(entry.commandId, entry.change)
    }
    confirmed.value = next
    known = Math.max(known, version)
  }

  /** The server says that there is more. */
  function heard(version: number) {
    if (version <= known && version <= confirmed.value.version) return
    known = Math.max(known, version)
    void sync()
  }
  /** Somebody has seen a refusal, and lets it be. */
  function dismiss(commandId: string) {
    refused.value = refused.value.filter((each) => each.command.id !== commandId)
  }
  /** Does a refused command after all, now that its author has seen the other value. */
  function insist(commandId: string) {
    const again = refused.value.find((each) => each.command.id === commandId)
    dismiss(commandId)
    if (!again) return
    const { id: _id, madeAt: _madeAt, ...intent } = again.command
    edit(intent as Intent)
  }
  function memberName(id: string): string {
    return members.value.find((member) => member.id === id)?.name ?? 'somebody'
  }
})

const isConflict = (details: unknown): details is ConflictDetails => typeof details === 'object' && details !== null && 'theirs' in details && 'field' in details

function safely<T>(work: () => T): T | undefined {
  try {
    return work()
  } catch {
    return undefined
  }
}
