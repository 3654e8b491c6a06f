import { maxCommandsPerPush, type JobOpened, type LogEntry, type PushAnswer, type RefusedCommand } from '../../../shared/api/jobs.ts'
import type { Command } from '../../../shared/commands/index.ts'
import { ApiProblem, NoConnection, sentenceOf } from '../../api/request.ts'
import type { JobApi } from './jobApi.ts'

/** Why what is done here does not reach the server just now. */
export type SyncTrouble = 'none' | 'no answer' | 'signed out' | 'not taken'

/** The open job as the exchange with the server sees it. */
export interface SyncPart {
  readonly api: JobApi
  /** The version that is confirmed here. */
  readonly version: () => number
  readonly waiting: () => readonly Command[]
  /** Folds accepted commands into what is confirmed; shows nothing yet. Throws when they do not fit. */
  readonly take: (entries: readonly LogEntry[]) => void
  /** Takes out what was decided, and shows the whole at once. */
  readonly settle: (accepted: readonly string[], refused: readonly RefusedCommand[]) => void
  /** Begins from the server's whole job again; what waits goes on waiting. */
  readonly afresh: (opened: JobOpened) => void
  readonly onTrouble: (trouble: SyncTrouble, sentence: string) => void
}

export interface JobSync {
  /** Sends and fetches now; resolves when there is nothing left or nobody answers. */
  readonly sync: () => Promise<void>
  /** The server says that there is a version. */
  readonly heard: (version: number) => void
  /** Asks whether there is more although nothing says so. */
  readonly ask: () => Promise<void>
  readonly stop: () => void
}

const firstWaitMs = 500
const longestWaitMs = 15_000
const mostFreshStarts = 2

/**
 * Sends what waits and takes in what others did: one request at a time, the same ids again when an answer was lost,
 * and again after a growing while when nobody answers.
 */
export function startJobSync(part: SyncPart): JobSync {
  const { api, version, waiting } = part
  let known = version()
  let running: Promise<void> | undefined
  let timer: ReturnType<typeof setTimeout> | undefined
  let waitMs = firstWaitMs
  let most = maxCommandsPerPush
  let freshStarts = 0
  let trouble: SyncTrouble = 'none'
  let asked = false
  let stopped = false

  return { sync, heard, ask, stop }

  function sync(): Promise<void> {
    // In trouble there is no telling that it has passed without asking.
    if (trouble !== 'none') asked = true
    running ??= run()
    return running
  }
  function heard(next: number) {
    known = Math.max(known, next)
    if (known > version() || waiting().length) void sync()
  }
  function ask(): Promise<void> {
    asked = true
    return sync()
  }
  function stop() {
    stopped = true
    clearTimeout(timer)
  }

  async function run(): Promise<void> {
    // Whatever else is done in the same breath travels along.
    await Promise.resolve()
    clearTimeout(timer)
    try {
      while (!stopped && (waiting().length || known > version() || asked)) {
        await step()
        freshStarts = 0
        if (!stopped) say('none', '')
      }
      waitMs = firstWaitMs
    } catch (error) {
      if (!stopped) fail(error)
    } finally {
      running = undefined
    }
  }
  async function step(): Promise<void> {
    try {
      const sent = waiting().slice(0, most)
      if (sent.length) await push(sent)
      else {
        await pull()
        if (!stopped) part.settle([], [])
      }
      asked = false
    } catch (error) {
      if (!mustBeginAfresh(error) || freshStarts >= mostFreshStarts) throw error
      freshStarts++
      const opened = await api.open()
      if (stopped) return
      known = opened.version
      part.afresh(opened)
      return step()
    }
  }
  async function push(sent: readonly Command[]): Promise<void> {
    const answer = await pushOrSplit(sent)
    if (!answer || stopped) return
    takeIn(answer.since)
    known = Math.max(known, answer.version)
    // Only when all of it is here is anything taken out of the queue: what one has done must not vanish for a moment.
    while (!stopped && version() < answer.version) await pull()
    if (!stopped) part.settle(answer.accepted.map((each) => each.commandId), answer.refused)
  }
  /** A request the server will never take is sent in halves, until the one command that it is about stands alone. */
  async function pushOrSplit(sent: readonly Command[]): Promise<PushAnswer | undefined> {
    try {
      const answer = await api.push(version(), sent)
      most = Math.min(maxCommandsPerPush, most * 2)
      return answer
    } catch (error) {
      if (stopped || !(error instanceof ApiProblem) || ![400, 413, 415, 422].includes(error.status)) throw error
      if (sent.length > 1) most = Math.ceil(sent.length / 2)
      else part.settle([], [{ commandId: sent[0]!.id, code: 'refused', message: error.message, details: null }])
      return undefined
    }
  }
  async function pull(): Promise<void> {
    const answer = await api.since(version())
    if (stopped) return
    takeIn(answer.since)
    known = Math.max(answer.version, answer.since.length ? known : 0)
    if (version() < answer.version && !answer.since.length) throw new Misfit('The server holds back what it says it has')
  }
  function takeIn(entries: readonly LogEntry[]) {
    try {
      part.take(entries)
    } catch (error) {
      throw new Misfit(error instanceof Error ? error.message : 'What the server sent does not fit')
    }
  }

  function fail(error: unknown) {
    freshStarts = 0
    if (error instanceof ApiProblem && error.status === 401) return say('signed out', error.message)
    if (error instanceof NoConnection) say('no answer', sentenceOf(error))
    else {
      if (!(error instanceof ApiProblem)) console.error(error)
      waitMs = longestWaitMs
      say('not taken', sentenceOf(error))
    }
    timer = setTimeout(() => void sync(), waitMs)
    waitMs = Math.min(waitMs * 2, longestWaitMs)
  }
  function say(next: SyncTrouble, sentence: string) {
    trouble = next
    part.onTrouble(next, sentence)
  }
}

/** What the server sent does not follow from what is here. */
class Misfit extends Error {
  override name = 'Misfit'
}

/** A server that is behind this device, after a backup was restored say, or that sends what does not fit: only the whole job helps. */
const mustBeginAfresh = (error: unknown) => error instanceof Misfit || (error instanceof ApiProblem && error.status === 409)
