/** What a stream says: a number that grows. */
interface Listening {
  readonly close: () => void
}

/**
 * Follows a server's events and comes back by itself; every message is a JSON object with a version. `onBroken` is told
 * each time the stream ends: the reason, a session that is over say, shows only to whoever asks otherwise.
 */
export function followVersions(path: string, onVersion: (version: number) => void, onBroken?: () => void): Listening {
  let source: EventSource | undefined
  let timer: ReturnType<typeof setTimeout> | undefined
  let waitMs = 1000
  let closed = false

  function open() {
    source = new EventSource(path)
    source.onopen = () => (waitMs = 1000)
    source.onmessage = (event: MessageEvent<string>) => {
      const version = versionIn(event.data)
      if (version !== undefined) onVersion(version)
    }
    source.onerror = () => {
      source?.close()
      if (closed) return
      onBroken?.()
      timer = setTimeout(open, waitMs)
      waitMs = Math.min(waitMs * 2, 30_000)
    }
  }
  open()
  return {
    close: () => {
      closed = true
      clearTimeout(timer)
      source?.close()
    },
  }
}

function versionIn(data: string): number | undefined {
  try {
    const said = JSON.parse(data) as { version?: unknown }
    return typeof said.version === 'number' ? said.version : undefined
  } catch {
    return undefined
  }
}
