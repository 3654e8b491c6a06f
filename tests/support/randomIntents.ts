import type { Intent } from '../../shared/commands/index.ts'
import { recordsOf, type JobDocument } from '../../shared/model/jobDocument.ts'
import { rectangle } from './build.ts'

/** A seeded source of numbers in [0, 1): the same seed gives the same story (mulberry32, public domain). */
export function seeded(seed: number): () => number {
  let state = seed >>> 0
  return () => {
    state = (state + 0x6d2b79f5) >>> 0
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state)
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296
  }
}

const at = '2026-12-01T10:00:00.000Z'

/**
 * Something a designer or a technician might do next to this job, possibly foolish. `newId` must never repeat.
 * Returns undefined when the die shows something that this job has nothing for.
 */
export function randomIntent(doc: JobDocument, random: () => number, newId: () => string): Intent | undefined {
  const pick = <T>(from: readonly T[]): T | undefined => from[Math.floor(random() * from.length)]
  const whole = (max: number) => Math.floor(random() * max)
  const rooms = recordsOf(doc, 'room')
  const plates = recordsOf(doc, 'plate')
  const runs = recordsOf(doc, 'run')
  const room = pick(rooms)
  const plate = pick(plates)
  const run = pick(runs)
  const type = pick(recordsOf(doc, 'cableType'))
  const panel = pick(recordsOf(doc, 'device').filter((device) => device.rackId !== null))
  const level = pick(recordsOf(doc, 'level'))
  const choices: (() => Intent | undefined)[] = [
    () => level && { verb: 'room.add', args: { id: newId(), levelId: level.id, name: `Room ${whole(99)}`, code: `R${whole(40)}`, outline: rectangle(whole(20_000), whole(9000), 3000 + whole(3000), 3000) } },
    () => room && { verb: 'plate.add', args: { id: newId(), roomId: room.id, form: 'wall-box', mounting: 'wall', wall: whole(4), alongMm: whole(3000), heightMm: 400, jacks: [{ id: newId(), position: 1, connector: 'speaker-pair' }] } },
    () => plate && { verb: 'plate.update', args: { ids: [plate.id], set: { alongMm: whole(4000), heightMm: whole(2500) } } },
    () => plate && room && { verb: 'plate.move', args: { moves: [{ id: plate.id, to: { roomId: room.id, alongMm: whole(2000) } }] } },
    () => room && { verb: 'room.update', args: { ids: [room.id], set: random() < 0.5 ? { name: `Name ${whole(9)}` } : { code: `C${whole(40)}` } } },
    () => type && { verb: 'run.add', args: { id: newId(), cableTypeId: type.id, a: panel ? { deviceId: panel.id, terminal: `p${1 + whole(12)}` } : null, b: plate ? { plateId: plate.id, jackId: plate.jacks[0]?.id ?? null } : null } },
    () => type && { verb: 'run.add', args: { id: newId(), cableTypeId: type.id, a: panel ? { deviceId: panel.id, terminal: `p${1 + whole(12)}` } : null, b: plate ? { plateId: plate.id, jackId: null } : null } },
    () => run && type && { verb: 'run.changeCable', args: { ids: [run.id], cableTypeId: type.id } },
    () => run && { verb: 'run.update', args: { ids: [run.id], set: random() < 0.5 ? { statedLengthMm: 1 + whole(60_000) } : { slackBMm: whole(4000), bundle: `B${whole(5)}` } } },
    () => run && { verb: 'run.setEnd', args: { id: run.id, end: random() < 0.5 ? 'a' : 'b', to: plate && random() < 0.7 ? { plateId: plate.id, jackId: null } : null } },
    () => run && { verb: 'run.drop', args: { ids: [run.id], reason: random() < 0.5 ? 'CO-2' : null } },
    () => run && { verb: 'items.remove', args: { items: [{ kind: 'run', id: run.id }] } },
    () => (random() < 0.4 && plate ? { verb: 'items.remove', args: { items: [{ kind: 'plate', id: plate.id }] } } : undefined),
    () => (random() < 0.2 && room ? { verb: 'items.remove', args: { items: [{ kind: 'room', id: room.id }] } } : undefined),
    () => run && { verb: 'pull.record', args: { pulls: [{ id: newId(), at, runId: run.id, markA: whole(99_999), markB: whole(99_999), markUnit: 'ft' }] } },
    () => run && { verb: 'termination.record', args: { terminations: [{ id: newId(), at, runId: run.id, end: random() < 0.5 ? 'a' : 'b' }] } },
    () => run && { verb: 'test.record', args: { tests: [{ id: newId(), at, runId: run.id, testKind: 'continuity', result: random() < 0.8 ? 'pass' : 'fail' }] } },
    () => run && { verb: 'label.print', args: { prints: [{ id: newId(), at, runId: run.id, end: 'b', copies: 2, stock: 'letter-30' }] } },
    () => {
      const pull = pick(recordsOf(doc, 'pull'))
      return pull && { verb: 'record.strike', args: { strikes: [{ id: newId(), at, targetKind: 'pull', targetId: pull.id, reason: 'wrong run' }] } }
    },
    () => plate && panel && { verb: 'cord.add', args: { id: newId(), a: { deviceId: panel.id, terminal: `p${1 + whole(12)}` }, b: { plateId: plate.id, jackId: plate.jacks[0]?.id ?? 'none' } } },
    () => room && type && {
      verb: 'batch',
      args: {
        label: 'Plate and run',
        steps: (() => {
          const [plateId, jackId] = [newId(), newId()]
          return [
            { verb: 'plate.add' as const, args: { id: plateId, roomId: room.id, form: 'ceiling-opening' as const, mounting: 'ceiling' as const, at: { xMm: whole(9000), yMm: whole(9000) }, heightMm: 2743, jacks: [{ id: jackId, position: 1, connector: 'speaker-pair' as const }] } },
            { verb: 'run.add' as const, args: { id: newId(), cableTypeId: type.id, a: null, b: { plateId, jackId } } },
          ]
        })(),
      },
    },
  ]
  return pick(choices)?.()
}
