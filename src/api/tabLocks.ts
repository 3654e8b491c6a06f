/** What is used of the browser's Web Locks; a test gives another. */
export interface TabLocks {
  readonly request: (name: string, options: { readonly ifAvailable?: boolean; readonly signal?: AbortSignal }, work: (lock: unknown) => Promise<void>) => Promise<unknown>
}

const lockOf = (tab: string) => `mudring-tab-${tab}`
let own: { readonly tab: string; readonly locks: TabLocks | undefined } | undefined

/** This page, which holds a lock of its own for as long as it lives: whoever gets that lock knows that the page is gone. */
export function thisTab() {
  if (!own) {
    const locks = 'locks' in navigator ? (navigator.locks as TabLocks) : undefined
    own = { tab: crypto.randomUUID(), locks }
    void locks?.request(lockOf(own.tab), {}, () => new Promise<void>(() => undefined))
  }
  return own
}

/**
 * Takes over what pages left behind: of those that are gone at once, of those that live when they go. Without locks
 * nobody can tell; then everything is taken, which the server's memory of command ids makes harmless.
 */
export async function adoptFromTabs<Kept>(
  locks: TabLocks | undefined,
  tabs: readonly string[],
  adopt: (tab: string) => Promise<readonly Kept[]>,
  onLeftBehind: (kept: readonly Kept[]) => void,
  signal: AbortSignal,
): Promise<void> {
  for (const tab of tabs) {
    if (!locks) {
      await adopt(tab)
      continue
    }
    let isGone = false
    await locks.request(lockOf(tab), { ifAvailable: true }, async (lock) => {
      if (!lock) return
      isGone = true
      await adopt(tab)
    })
    if (isGone) continue
    // An abort, when the job is left first, is no failure.
    void locks.request(lockOf(tab), { signal }, async () => onLeftBehind(await adopt(tab))).catch(() => undefined)
  }
}
