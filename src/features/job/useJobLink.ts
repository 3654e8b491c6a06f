import { onBeforeUnmount, watch } from 'vue'
import { followVersions } from '../../api/eventStream.ts'
import { outboxDisk } from '../../api/outboxDisk.ts'
import { useSessionStore } from '../session/sessionStore.ts'
import { jobApi } from './jobApi.ts'
import { useJobStore } from './jobStore.ts'
import { useSelectionStore } from './selectionStore.ts'

/** Opens a job while its frame is there, and keeps it in touch with the server. Returns how to try again. */
export function useJobLink(jobId: () => string): () => void {
  const store = useJobStore()
  const session = useSessionStore()
  const selection = useSelectionStore()
  let stream: ReturnType<typeof followVersions> | undefined
  let role = session.member?.role

  watch(jobId, open, { immediate: true })
  // Somebody who signs in again may have another role than before: what waits is then judged by that.
  const stopListening = session.onResumed(() => (role === session.member?.role ? touch() : open()))
  window.addEventListener('online', touch)
  document.addEventListener('visibilitychange', onVisible)
  window.addEventListener('beforeunload', onUnload)
  onBeforeUnmount(() => {
    window.removeEventListener('online', touch)
    document.removeEventListener('visibilitychange', onVisible)
    window.removeEventListener('beforeunload', onUnload)
    stopListening()
    stream?.close()
    store.close()
    selection.clear()
  })
  return open

  function open() {
    const { member } = session
    if (!member) return
    role = member.role
    stream?.close()
    selection.clear()
    void store.open({ jobId: jobId(), actor: { id: member.id, role }, api: jobApi(jobId()), disk: outboxDisk(jobId(), member.id) })
    stream = followVersions(`/api/jobs/${encodeURIComponent(jobId())}/events`, store.heard, () => void store.ask())
  }
  /** The connection, the session or the person is back: no waiting for the next try. */
  function touch() {
    if (store.status === 'failed') open()
    else void store.ask()
  }
  function onVisible() {
    if (document.visibilityState === 'visible') touch()
  }
  function onUnload(event: BeforeUnloadEvent) {
    if (!store.isSafe && store.outbox.length) event.preventDefault()
  }
}
