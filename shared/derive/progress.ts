import { stages, type Progress, type RunFacts, type Stage } from './facts.ts'

export const noProgress: Progress = { total: 0, pulled: 0, terminated: 0, tested: 0 }

const reached = (stage: Stage, least: Stage) => stages.indexOf(stage) >= stages.indexOf(least)

/** How far a job, each level and each room have come. Runs that are dropped do not count. */
export function tally(runs: Iterable<RunFacts>): { whole: Progress; levels: ReadonlyMap<string, Progress>; rooms: ReadonlyMap<string, Progress> } {
  const whole = { ...noProgress }
  const levels = new Map<string, Progress>()
  const rooms = new Map<string, Progress>()
  for (const { stage, dropped, roomId, levelId } of runs) {
    if (dropped !== null) continue
    add(whole, stage)
    if (roomId !== null) add(of(rooms, roomId), stage)
    if (levelId !== null) add(of(levels, levelId), stage)
  }
  return { whole, levels, rooms }
}

type Count = { -readonly [F in keyof Progress]: number }

function of(counts: Map<string, Progress>, id: string): Count {
  let count = counts.get(id)
  if (!count) counts.set(id, (count = { ...noProgress }))
  return count as Count
}

function add(count: Count, stage: Stage) {
  count.total++
  if (reached(stage, 'pulled')) count.pulled++
  if (reached(stage, 'terminated')) count.terminated++
  if (reached(stage, 'tested')) count.tested++
}
