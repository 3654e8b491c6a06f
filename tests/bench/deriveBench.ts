import { plan, type Command } from '../../shared/commands/index.ts'
import { deriveJob } from '../../shared/derive/deriveJob.ts'
import { recordsOf, type JobDocument } from '../../shared/model/jobDocument.ts'
import { apply } from '../../shared/sync/change.ts'
import { replay } from '../../shared/sync/replay.ts'
import { asDesigner } from '../support/checkCommand.ts'
import { playFixture } from '../support/playFixture.ts'
import { bigHouse } from './bigHouse.ts'
import { growthExponent, median, row, timed, type Row } from './measure.ts'

const sizes = [60, 600, 6000] as const

/** Deriving the whole job by size, after one edit, and replaying a queue. */
export async function deriveBench(): Promise<Row[]> {
  const docs = sizes.map((size) => playFixture(bigHouse(size)))
  const whole: [number, number][] = []
  for (const [index, doc] of docs.entries()) whole.push([sizes[index]!, await timed(index === 2 ? 5 : 15, () => deriveJob({ ...doc }))])
  const largest = docs[2]!
  const edit = afterOneEdit(largest)
  const [time60, time6000] = [whole[0]![1], whole[2]![1]]
  return [
    row('recompute-whole', time6000, time60 * 100, 'ms, 6,000 runs against 100 times 60 runs', growthExponent(whole)),
    row('recompute-edit', edit, time6000, 'ms, one edit against the whole at 6,000 runs'),
    await replayQueue(),
  ]
}

/** One edit to one run, each to another, on a derivation that goes along. */
function afterOneEdit(doc: JobDocument): number {
  const runs = recordsOf(doc, 'run')
  let current = doc
  let derived = deriveJob(doc)
  const taken: number[] = []
  for (let i = 0; i < 40; i++) {
    const run = runs[(i * 151) % runs.length]!
    current = apply(current, plan(current, { verb: 'run.update', args: { ids: [run.id], set: { statedLengthMm: 20_000 + i } } }, asDesigner))
    const start = performance.now()
    derived = deriveJob(current, derived)
    taken.push(performance.now() - start)
  }
  return median(taken.slice(5))
}

/** 200 queued commands over some 6,000 records, against the same fields written into a plain map. */
async function replayQueue(): Promise<Row> {
  const doc = playFixture(bigHouse(2000))
  const runs = recordsOf(doc, 'run')
  const commands = Array.from({ length: 200 }, (_, i) => ({ id: `q${i}`, madeAt: 0, verb: 'run.update', args: { ids: [runs[(i * 7) % runs.length]!.id], set: { purpose: `Purpose ${i}` } } }) as Command)
  const ours = await timed(7, () => {
    const played = replay(doc, commands, { actor: asDesigner.actor, changeOf: () => undefined })
    if (played.refused.length) throw new Error(played.refused[0]!.error.message)
  })
  const reference = await timed(7, () => {
    let records = new Map(doc.records.run)
    for (const [i, command] of commands.entries()) {
      const id = (command.args as { ids: string[] }).ids[0]!
      records = new Map(records)
      records.set(id, { ...records.get(id)!, purpose: `Purpose ${i}` })
    }
  })
  return row('replay-200', ours, reference, 'ms, 200 commands against the same writes to a copied map')
}
