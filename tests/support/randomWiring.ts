import type { Intent } from '../../shared/commands/index.ts'
import type { Finding } from '../../shared/checks/finding.ts'
import { struckKinds } from '../../shared/model/fieldRecord.ts'
import { jobOf, recordsOf, type JobDocument } from '../../shared/model/jobDocument.ts'
import { spaceClasses } from '../../shared/model/place.ts'
import type { CordEnd, RunEnd } from '../../shared/model/run.ts'
import { lossConventions } from '../../shared/model/limits.ts'

const at = '2026-12-01T10:00:00.000Z'

/**
 * Something done to what runs hang on: devices, cords, hops, racks, chases, levels, types, models, limits, acceptances
 * and strikes. Undefined when the die shows something that this job has nothing for.
 */
export function randomWiring(doc: JobDocument, findings: readonly Finding[], random: () => number, newId: () => string): Intent | undefined {
  const pick = <T>(from: readonly T[]): T | undefined => from[Math.floor(random() * from.length)]
  const whole = (max: number) => Math.floor(random() * max)
  const [devices, runs, plates, levels] = [recordsOf(doc, 'device'), recordsOf(doc, 'run'), recordsOf(doc, 'plate'), recordsOf(doc, 'level')]
  const [device, run, plate, level, room, rack] = [pick(devices), pick(runs), pick(plates), pick(levels), pick(recordsOf(doc, 'room')), pick(recordsOf(doc, 'rack'))]
  const [type, model, finding, cord] = [pick(recordsOf(doc, 'cableType')), pick(recordsOf(doc, 'deviceModel')), pick(findings), pick(recordsOf(doc, 'cord'))]
  const terminal = (): Extract<RunEnd & CordEnd, { deviceId: string }> | undefined => {
    const on = pick(devices)
    const key = on && pick(doc.records.deviceModel.get(on.modelId)?.terminals ?? [])?.key
    return on && key !== undefined ? { deviceId: on.id, terminal: key } : undefined
  }
  const end = (): CordEnd | undefined => {
    const on = pick(plates)
    const jack = on && pick(on.jacks)
    return random() < 0.3 && on && jack ? { plateId: on.id, jackId: jack.id } : terminal()
  }
  const choices: (() => Intent | undefined)[] = [
    () => device && { verb: 'device.update', args: { ids: [device.id], set: pick([{ tapW: pick([null, 7.5, 15]) ?? null }, { loadOhm: pick([null, 4, 8]) ?? null }, { name: `Device ${whole(9)}` }, { zones: { ch1: `Zone ${whole(4)}` } }])! } },
    () => device && plate && { verb: 'device.move', args: { moves: [{ id: device.id, to: { plateId: plate.id, rackId: null, unit: null, roomId: null, at: null } }] } },
    () => device && rack && { verb: 'device.move', args: { moves: [{ id: device.id, to: { plateId: null, rackId: rack.id, unit: 1 + whole(40), roomId: null, at: null } }] } },
    () => device && room && { verb: 'device.move', args: { moves: [{ id: device.id, to: { plateId: null, rackId: null, unit: null, roomId: room.id, at: random() < 0.7 ? { xMm: whole(9000), yMm: whole(9000) } : null } }] } },
    () => model && plate && { verb: 'device.add', args: { id: newId(), modelId: model.id, plateId: plate.id, name: 'Another' } },
    () => device && { verb: 'items.remove', args: { items: [{ kind: 'device', id: device.id }] } },
    () => { const [a, b] = [end(), end()]; return a && b && { verb: 'cord.add', args: { id: newId(), a, b, lengthMm: 500 + whole(9000) } } },
    () => cord && { verb: 'items.remove', args: { items: [{ kind: 'cord', id: cord.id }] } },
    () => { const [a, b] = [terminal(), terminal()]; return type && a && b && { verb: 'run.add', args: { id: newId(), cableTypeId: type.id, a, b } } },
    () => { const to = random() < 0.8 ? terminal() : rack && { rackId: rack.id }; return run && to && { verb: 'run.setEnd', args: { id: run.id, end: random() < 0.5 ? 'a' : 'b', to } } },
    () => run && { verb: 'run.update', args: { ids: [run.id], set: pick([{ loadJoin: 'series' as const }, { route: 'underfloor' as const }, { pathwayIds: [...doc.records.pathway.keys()].slice(0, 2) }, { statedLengthMm: null }])! } },
    () => ({ verb: 'job.update', args: { set: pick([{ slackRackMm: whole(4000) }, { lengthUnit: random() < 0.5 ? ('m' as const) : ('ft' as const) }, { limits: { ...jobOf(doc).limits, speakerLossConvention: pick(lossConventions)!, speakerLossCaution: 1 + whole(10), speakerLossStop: 12, conductorTemperatureC: whole(50) } }, { limits: { ...jobOf(doc).limits, occupancy: pick(['one or two family', 'multifamily', 'other'] as const)! } }])! } }),
    () => level && { verb: 'level.update', args: { ids: [level.id], set: random() < 0.5 ? { elevationMm: whole(9000) } : { ceilingHeightMm: 2000 + whole(2000) } } },
    () => room && level && { verb: 'room.update', args: { ids: [room.id], set: random() < 0.5 ? { levelId: level.id } : { spaceClass: pick(spaceClasses)! } } },
    () => rack && room && { verb: 'rack.update', args: { ids: [rack.id], set: random() < 0.5 ? { at: { xMm: whole(9000), yMm: whole(9000) } } : { roomId: room.id } } },
    () => room && { verb: 'rack.add', args: { id: newId(), roomId: room.id, name: 'Another rack', code: `K${whole(99)}`, units: 20, at: { xMm: whole(9000), yMm: whole(9000) } } },
    () => levels.length > 1 ? { verb: 'pathway.add', args: { id: newId(), name: 'Another chase', form: 'chase', at: { xMm: whole(9000), yMm: whole(9000) }, bottomLevelId: levels[0]!.id, topLevelId: levels[1]!.id } } : undefined,
    () => { const chase = pick(recordsOf(doc, 'pathway')); return chase && { verb: 'items.remove', args: { items: [{ kind: 'pathway', id: chase.id }] } } },
    () => type && { verb: 'cableType.update', args: { ids: [type.id], set: pick([{ awg: 10 + whole(9), resistanceOhmPerKm: null }, { jacketRating: pick(['CMP', 'CL3', 'CL3R', 'none'] as const)! }, { conductors: pick([2, 4])! }, { code: `C${whole(9)}` }])! } },
    () => model && { verb: 'deviceModel.update', args: { ids: [model.id], set: { terminals: model.terminals.map((each) => ({ ...each, ratings: { ...each.ratings, ...(each.direction === 'in' ? { loadOhm: 4 + whole(8) } : { minLoadOhm: 2 + whole(8) }) } })) } } },
    () => finding && { verb: 'finding.accept', args: { acceptances: [{ id: newId(), at, check: finding.check, aboutKind: finding.about.kind, aboutId: finding.about.id, figures: finding.figures, reason: 'My call' }] } },
    () => { const kind = pick(struckKinds)!; const target = pick([...doc.records[kind].keys()]); return target === undefined ? undefined : { verb: 'record.strike', args: { strikes: [{ id: newId(), at, targetKind: kind, targetId: target, reason: 'wrong' }] } } },
  ]
  return pick(choices)?.()
}
