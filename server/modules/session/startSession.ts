import type { Request } from 'express'

/** A new session with a new id, so that one planted or known from before is worth nothing. */
export async function startSession(
  request: Request,
  member: { readonly companyId: string; readonly id: string },
): Promise<void> {
  await settled((done) => request.session.regenerate(done))
  request.session.companyId = member.companyId
  request.session.memberId = member.id
  request.session.startedAt = Date.now()
  await settled((done) => request.session.save(done))
}

export const endSession = (request: Request): Promise<void> => settled((done) => request.session.destroy(done))

const settled = (start: (done: (error?: unknown) => void) => void) =>
  new Promise<void>((done, fail) => {
    start((error) => (error ? fail(error instanceof Error ? error : new Error(String(error))) : done()))
  })
