/** What the measuring of HTTP uses of autocannon 9, which brings no types. */
declare module 'autocannon' {
  interface CannonRequest {
    method: 'GET' | 'POST'
    path: string
    headers?: Record<string, string>
    body?: string
    /** Called before each sending; what it returns is sent. */
    setupRequest?: (request: CannonRequest) => CannonRequest
    onResponse?: (status: number, body: string) => void
  }
  interface CannonOptions {
    url: string
    connections: number
    /** Seconds. */
    duration: number
    /** Called for each connection before it sends. */
    setupClient: (client: { setRequests: (requests: CannonRequest[]) => void }) => void
  }
  interface CannonResult {
    duration: number
    errors: number
    timeouts: number
    non2xx: number
  }
  export default function autocannon(options: CannonOptions): Promise<CannonResult>
}
