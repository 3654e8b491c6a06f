import { onBeforeUnmount, onMounted, ref, shallowRef } from 'vue'
import type { JobList, JobSummary } from '../../../shared/api/jobs.ts'
import { keptByJob } from '../../api/outboxDisk.ts'
import { request, sentenceOf } from '../../api/request.ts'
import { useSessionStore } from '../session/sessionStore.ts'

const soonMs = 700
const laterMs = 60_000

/** The company's jobs, asked for again while the page is looked at; what could be had last stays when nobody answers. */
export function useJobs() {
  const session = useSessionStore()
  const jobs = shallowRef<readonly JobSummary[]>()
  const kept = shallowRef<ReadonlyMap<string, number>>(new Map())
  const fault = ref('')
  /** When the list was last true. */
  const now = shallowRef(new Date())
  let timer: ReturnType<typeof setTimeout> | undefined

  onMounted(() => {
    void load()
    document.addEventListener('visibilitychange', onVisible)
    window.addEventListener('online', onVisible)
  })
  onBeforeUnmount(() => {
    clearTimeout(timer)
    document.removeEventListener('visibilitychange', onVisible)
    window.removeEventListener('online', onVisible)
  })
  return { jobs, kept, fault, now, load }

  async function load() {
    clearTimeout(timer)
    let waitMs = laterMs
    try {
      const answer = await request<JobList>('GET', '/api/jobs')
      jobs.value = answer.jobs
      now.value = new Date()
      fault.value = ''
      if (answer.jobs.some((job) => job.standing === null)) waitMs = soonMs
    } catch (error) {
      fault.value = sentenceOf(error)
    }
    // A browser that keeps nothing has nothing to tell here.
    kept.value = await keptByJob(session.member?.id ?? '').catch(() => new Map())
    clearTimeout(timer)
    timer = setTimeout(() => document.visibilityState === 'visible' && void load(), waitMs)
  }
  function onVisible() {
    if (document.visibilityState === 'visible') void load()
  }
}
