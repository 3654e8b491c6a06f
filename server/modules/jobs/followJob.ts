import type { Request } from 'express'
import { AppError } from '../../../shared/errors.ts'
import { can } from '../../../shared/policy.ts'
import { whoAsks } from '../../http/registerRoutes.ts'
import type { MemberContext } from '../../http/routeTable.ts'
import type { JobScope } from './documentRepo.ts'
import { needVersion, type JobsContext } from './jobsContext.ts'

/** Streams one member may hold at once: a browser keeps one for each open job, and a few devices each have theirs. */
const mostPerMember = 12
const heartbeatMs = 20_000
/** How long a stream outlives a sign-out or a lost right at most. */
const recheckMs = 3000

const held = new Map<string, number>()

/**
 * Tells a client whenever its job has a new version, and nothing else: what changed is fetched, and rights are checked
 * there. The stream ends with the session, with the right to read, and with the server.
 */
export async function followJob(context: JobsContext, { deps, member, request, response }: MemberContext, scope: JobScope): Promise<void> {
  const version = await needVersion(context, scope)
  const holder = `${member.companyId}/${member.id}`
  if ((held.get(holder) ?? 0) >= mostPerMember) throw new AppError('too_many', `At most ${mostPerMember} jobs are followed at once. Close one of the other windows`, { retryAfterSeconds: 5 })
  if (deps.closing.aborted) throw new AppError('unavailable', 'The server is stopping. Try again in a moment')

  held.set(holder, (held.get(holder) ?? 0) + 1)
  response.writeHead(200, { 'Content-Type': 'text/event-stream', 'Cache-Control': 'no-store', 'X-Accel-Buffering': 'no' })
  const say = (text: string) => {
    if (!response.writableEnded) response.write(text)
  }
  const tell = (next: number) => say(`id: ${next}\ndata: ${JSON.stringify({ version: next })}\n\n`)
  const end = () => response.end()
  tell(version)
  const unfollow = context.feed.follow(scope, { onVersion: tell, onEnd: end })
  const heartbeat = setInterval(() => say(': still here\n\n'), heartbeatMs)
  const recheck = setInterval(() => void mayStillRead(request, deps).then((may) => (may ? undefined : end())), recheckMs)
  const letGo = () => {
    unfollow()
    clearInterval(heartbeat)
    clearInterval(recheck)
    const left = (held.get(holder) ?? 1) - 1
    if (left) held.set(holder, left)
    else held.delete(holder)
  }
  // A client that left while its job was looked up has closed the response already.
  if (response.closed || response.destroyed) letGo()
  else response.once('close', letGo)
}

async function mayStillRead(request: Request, deps: MemberContext['deps']): Promise<boolean> {
  try {
    await new Promise<void>((done, fail) => request.session.reload((error: unknown) => (error ? fail(new Error('The session has ended')) : done())))
    return can((await whoAsks(request, deps)).role, 'job.read')
  } catch {
    return false
  }
}
