import { Worker } from 'node:worker_threads'
import { AppError } from '../../../shared/errors.ts'

/** A passphrase to hash at a cost, or to hold against a hash. */
export type Question =
  { readonly passphrase: string; readonly cost: number } | { readonly passphrase: string; readonly hash: string }
type Answer = string | boolean

/** Hashing is slow on purpose; on threads of its own it keeps nobody else waiting. */
const mostThreads = 2
/** Whoever comes when more are waiting would not be answered within reason. */
const mostWaiting = 60

interface Job {
  readonly question: Question
  readonly done: (answer: Answer) => void
  readonly fail: (error: Error) => void
}

const idle: Worker[] = []
const waiting: Job[] = []
let threads = 0

/** Answers by another thread. Throws AppError unavailable when too many wait. */
export function askThread(question: Question): Promise<Answer> {
  if (waiting.length >= mostWaiting)
    return Promise.reject(
      new AppError('unavailable', 'Too many people are signing in at this moment. Try again in a few seconds', {
        retryAfterSeconds: 3,
      }),
    )
  return new Promise((done, fail) => {
    waiting.push({ question, done, fail })
    next()
  })
}

function next() {
  const worker = waiting.length ? (idle.pop() ?? (threads < mostThreads ? start() : undefined)) : undefined
  if (!worker) return
  const { question, done, fail } = waiting.shift()!
  const settle = (leave: () => void) => {
    worker.removeAllListeners('message')
    worker.removeAllListeners('error')
    leave()
    next()
  }
  worker.once('message', (answer: Answer) =>
    settle(() => {
      // An idle thread does not keep the process alive.
      worker.unref()
      idle.push(worker)
      done(answer)
    }),
  )
  worker.once('error', (error: Error) =>
    settle(() => {
      threads--
      fail(error)
    }),
  )
  worker.ref()
  worker.postMessage(question)
}

function start(): Worker {
  threads++
  return new Worker(new URL('./passphraseWorker.js', import.meta.url), { execArgv: [] })
}
