import type { Catalog, CatalogCableType } from '../../../../shared/api/catalog.ts'
import type { Intent, Step } from '../../../../shared/commands/index.ts'
import type { CableDescription } from '../../../../shared/model/cableType.ts'
import { find, recordsOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import type { Connector, Plate } from '../../../../shared/model/place.ts'
import { connectorOf, connectorWord, fits } from './connectors.ts'
import { takenPorts, takePort } from './freePorts.ts'
import { copyOfCable, type Copy } from './jobCopies.ts'
import { gangsFor, type PlatePreset } from './platePresets.ts'
import { placeAt, type RoomPoint } from './roomPoint.ts'

/** A cable to lay: one that the job has, or one of the catalogue. */
export type CableChoice = { readonly cableTypeId: string } | { readonly entry: CatalogCableType }

export interface Planned {
  readonly intent: Intent
  /** The plate and runs that it makes, to select them afterwards. */
  readonly plateId: string
  readonly runIds: readonly string[]
  /** What to say with it: a run without a port or without a rack. Null: nothing. */
  readonly caution: string | null
}

export const descriptionOf = (doc: JobDocument, choice: CableChoice): CableDescription | undefined =>
  'entry' in choice ? choice.entry.description : find(doc, 'cableType', choice.cableTypeId)

/** A plate where somebody clicked, and, with it, a run for each jack from the next free port that fits: one command. */
export function planPlate(doc: JobDocument, catalog: Catalog | null, point: RoomPoint, preset: PlatePreset, options: { withRuns: boolean; cable?: CableChoice; newId: () => string }): Planned {
  const { newId } = options
  const plateId = newId()
  const place = placeAt(doc, point, preset.mounting, preset.heightMm)
  const jacks = preset.jacks.map((connector, index) => ({ id: newId(), position: index + 1, connector }))
  const steps: Step[] = [{ verb: 'plate.add', args: { id: plateId, ...place, name: preset.name, form: preset.form, gangs: gangsFor(jacks.length), jacks } }]
  const room = find(doc, 'room', point.roomId)
  const laid = options.withRuns ? layRuns(doc, catalog, { plateId, roomId: point.roomId, jacks, purpose: preset.name, newId, ...(options.cable ? { cable: options.cable } : {}) }) : noRuns
  const label = laid.runIds.length ? `Add a plate with ${laid.runIds.length === 1 ? 'a run' : `${laid.runIds.length} runs`} in ${room?.name ?? 'the room'}` : `Add a plate in ${room?.name ?? 'the room'}`
  return { intent: { verb: 'batch', args: { label, steps: [...laid.copies, ...steps, ...laid.steps] } }, plateId, runIds: laid.runIds, caution: laid.caution }
}

/** One more jack and run on a plate that is there. */
export function planJackRun(doc: JobDocument, plate: Plate, cable: CableChoice, newId: () => string): Planned {
  const type = descriptionOf(doc, cable)!
  const connector = connectorOf(type)
  const open = plate.jacks.find((jack) => fits(jack.connector, connector) && !recordsOf(doc, 'run').some((run) => [run.a, run.b].some((end) => end && 'plateId' in end && end.jackId === jack.id)))
  const jack = open ?? { id: newId(), position: Math.max(0, ...plate.jacks.map((each) => each.position)) + 1, connector }
  const jacks = [...plate.jacks, jack]
  const grow: Step[] = open ? [] : [{ verb: 'plate.update', args: { ids: [plate.id], set: { jacks, gangs: Math.max(plate.gangs, gangsFor(jacks.length)) } } }]
  const laid = layRuns(doc, null, { plateId: plate.id, roomId: plate.roomId, jacks: [jack], purpose: plate.name, newId, cable })
  return { intent: { verb: 'batch', args: { label: `Lay a ${type.code} run to a plate`, steps: [...laid.copies, ...grow, ...laid.steps] } }, plateId: plate.id, runIds: laid.runIds, caution: laid.caution }
}

interface Laid {
  readonly copies: readonly Step[]
  readonly steps: readonly Step[]
  readonly runIds: readonly string[]
  readonly caution: string | null
}
const noRuns: Laid = { copies: [], steps: [], runIds: [], caution: null }

interface Lay {
  readonly plateId: string
  readonly roomId: string
  readonly jacks: readonly { readonly id: string; readonly connector: Connector }[]
  readonly purpose: string
  readonly cable?: CableChoice
  readonly newId: () => string
}

function layRuns(doc: JobDocument, catalog: Catalog | null, lay: Lay): Laid {
  const taken = takenPorts(doc)
  const copies = new Map<string, Copy>()
  const runs: Step[] = []
  const runIds: string[] = []
  let caution: string | null = null
  for (const jack of lay.jacks) {
    const choice = lay.cable ?? usualCable(doc, catalog, jack.connector)
    if (!choice) {
      caution = `No cable for a ${connectorWord[jack.connector]} jack yet, so it has no run`
      continue
    }
    const key = 'entry' in choice ? choice.entry.id : choice.cableTypeId
    const copy = copies.get(key) ?? ('entry' in choice ? copyOfCable(doc, choice.entry, lay.newId) : { id: choice.cableTypeId, steps: [] })
    copies.set(key, copy)
    const a = takePort(doc, lay.roomId, jack.connector, taken)
    if (!a) caution = 'There is no rack yet, so the run has one end. Add a rack, and join it'
    else if ('rackId' in a) caution = `No ${connectorWord[jack.connector]} port is free, so the run ends at the rack. Add a panel to land it`
    const id = lay.newId()
    runIds.push(id)
    runs.push({ verb: 'run.add', args: { id, cableTypeId: copy.id, a, b: { plateId: lay.plateId, jackId: jack.id }, purpose: lay.purpose.slice(0, 60) } })
  }
  return { copies: [...copies.values()].flatMap((copy) => copy.steps), steps: runs, runIds, caution }
}

/** Codes that a job without any cable for a jack begins with: the usual ones of the trade. */
const usual: Partial<Record<Connector, string>> = { modular: 'CAT6', coax: 'RG6', 'speaker-pair': '16/2', keypad: '22/4', control: '22/2', power: 'SHD', fibre: 'OM4', line: 'SUB' }

/** The cable that a jack gets where nobody chose: the one the job uses most for it, else the usual one of the catalogue. */
export function usualCable(doc: JobDocument, catalog: Catalog | null, connector: Connector): CableChoice | null {
  const uses = new Map<string, number>()
  for (const run of doc.records.run.values()) {
    const exact = [run.a, run.b].some((end) => end && 'plateId' in end && find(doc, 'plate', end.plateId)?.jacks.find((jack) => jack.id === end.jackId)?.connector === connector)
    if (exact) uses.set(run.cableTypeId, (uses.get(run.cableTypeId) ?? 0) + 1)
  }
  const fitting = recordsOf(doc, 'cableType').filter((type) => fits(connectorOf(type), connector))
  const [most] = fitting.filter((type) => uses.has(type.id)).sort((a, b) => uses.get(b.id)! - uses.get(a.id)!)
  const own = most ?? fitting.find((type) => type.code === usual[connector]) ?? (catalog ? undefined : fitting[0])
  if (own) return { cableTypeId: own.id }
  const offers = (catalog?.cableTypes ?? []).filter((entry) => fits(connectorOf(entry.description), connector))
  const entry = offers.find((each) => each.description.code === usual[connector]) ?? offers[0]
  return entry ? { entry } : fitting[0] ? { cableTypeId: fitting[0].id } : null
}
