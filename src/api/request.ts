/** A refusal from the server, as problem details (RFC 9457) say it. */
export class ApiProblem extends Error {
  override name = 'ApiProblem'
  constructor(
    readonly status: number,
    readonly type: string,
    message: string,
    readonly details: unknown,
  ) {
    super(message)
  }
}

/** The server could not be reached or did not answer in time: not a refusal, so the same may be tried again. */
export class NoConnection extends Error {
  override name = 'NoConnection'
}

const deadlineMs = 20_000

/** Told when the server says that the session has ended, whoever was asking. */
const endedListeners = new Set<() => void>()
export function onSessionEnded(listener: () => void): () => void {
  endedListeners.add(listener)
  return () => endedListeners.delete(listener)
}

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'

/** The one fetch: JSON there and back. Throws ApiProblem when refused, NoConnection when nobody answered. */
export async function request<Answer>(method: Method, path: string, body?: unknown): Promise<Answer> {
  const response = await send(method, path, body)
  if (response.status === 204) return undefined as Answer
  return (await response.json()) as Answer
}

/** The same for an answer that is a file. */
export async function requestFile(method: Method, path: string, body?: unknown): Promise<Blob> {
  return (await send(method, path, body)).blob()
}

async function send(method: Method, path: string, body: unknown): Promise<Response> {
  const response = await fetch(path, {
    method,
    credentials: 'same-origin',
    signal: AbortSignal.timeout(deadlineMs),
    ...(body === undefined ? {} : { headers: { 'Content-Type': 'application/json' }, body: JSON.stringify(body) }),
  }).catch((error: unknown) => {
    throw new NoConnection(error instanceof Error ? error.message : 'No answer')
  })
  if (response.ok) return response
  // Whatever stands between may answer for a server that is gone.
  if ([502, 503, 504].includes(response.status)) throw new NoConnection(`The server answered ${response.status}`)
  const problem = await readProblem(response)
  if (response.status === 401 && path !== '/api/session') for (const listener of endedListeners) listener()
  throw problem
}

async function readProblem(response: Response): Promise<ApiProblem> {
  const said = (await response.json().catch(() => ({}))) as { type?: string; detail?: string; details?: unknown }
  return new ApiProblem(response.status, said.type ?? '/problems/internal', said.detail ?? 'Something went wrong. Try again', said.details)
}

/** The sentence to show for whatever went wrong. */
export function sentenceOf(error: unknown): string {
  if (error instanceof NoConnection) return 'No answer from the server. What you have done is kept here'
  return error instanceof Error ? error.message : 'Something went wrong. Try again'
}
