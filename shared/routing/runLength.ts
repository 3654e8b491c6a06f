import { fiveDigitCounter, pulledLengthMm } from '../calc/length/jacketMarks.ts'
import type { LengthMakeUp, RunLength } from '../derive/facts.ts'
import type { JobReader } from '../derive/jobReader.ts'
import type { Said } from '../derive/said.ts'
import type { Level, Pathway } from '../model/place.ts'
import type { Run } from '../model/run.ts'
import { along, chosenWay, shortestWay, type Stop, type Way } from './chaseGraph.ts'
import { endSpot, type EndSpot } from './endSpot.ts'

type Drawn = NonNullable<LengthMakeUp['drawn']>

/**
 * Length of a run and how it is known: pulled (both jacket marks) before stated before drawn. The drawn parts come along
 * in any case where the drawing says enough. Waste is never in it. What is missing is said in a sentence.
 */
export function runLength(reader: JobReader, run: Run, said: Said): RunLength {
  const drawn = drawnLength(reader, run)
  const parts = typeof drawn === 'string' ? null : drawn
  const pulledMm = pulled(said)
  if (pulledMm !== null) return { length: { basis: 'pulled', totalMm: pulledMm, drawn: parts }, missing: null }
  if (run.statedLengthMm !== null) return { length: { basis: 'stated', totalMm: run.statedLengthMm, drawn: parts }, missing: null }
  if (typeof drawn === 'string') return { length: null, missing: drawn }
  return { length: { basis: 'drawn', totalMm: drawn.totalMm, drawn }, missing: null }
}

function pulled({ markedPull }: Said): number | null {
  if (!markedPull) return null
  const mm = pulledLengthMm({ start: markedPull.markA!, end: markedPull.markB!, unit: markedPull.markUnit, counter: fiveDigitCounter })
  return mm === null || mm <= 0 ? null : Math.round(mm)
}

/** Rise at end a, way along, drop at end b and slack, mm; or what the drawing does not say. */
function drawnLength(reader: JobReader, run: Run): Drawn | string {
  const a = endSpot(reader, run.a)
  const b = endSpot(reader, run.b)
  if (typeof a === 'string') return `No length drawn: at end a, ${a}`
  if (typeof b === 'string') return `No length drawn: at end b, ${b}`
  const job = reader.job()
  const slackAMm = run.slackAMm ?? (a.atRack ? job.slackRackMm : job.slackPlateMm)
  const slackBMm = run.slackBMm ?? (b.atRack ? job.slackRackMm : job.slackPlateMm)
  const riseMm = Math.abs(planeHeight(a.level, run) - a.heightMm)
  const dropMm = Math.abs(planeHeight(b.level, run) - b.heightMm)
  const way = wayAlong(reader, run, a, b)
  const alongMm = Math.round(way.alongMm)
  return { riseMm, alongMm, dropMm, slackAMm, slackBMm, totalMm: riseMm + alongMm + dropMm + slackAMm + slackBMm, pathwayIds: way.pathwayIds, way: wordsOf(reader, a, b, way, run) }
}

/**
 * How high over its floor a level's cables run, mm: over the ceiling of a lived-in level, a basement or a crawl space
 * (its ceiling is the floor above), on the floor of an attic and on the ground outside.
 */
export function planeHeight(level: Level, run: Pick<Run, 'route'>): number {
  if (run.route === 'underfloor') return 0
  if (run.route === 'overhead') return level.ceilingHeightMm
  return level.use === 'attic' || level.use === 'outside' ? 0 : level.ceilingHeightMm
}

function wayAlong(reader: JobReader, run: Run, a: EndSpot, b: EndSpot): Way & { straight?: true } {
  const [from, to, planeOf] = [stopAt(a), stopAt(b), planes(reader, run)]
  const chosen = run.pathwayIds.length ? chosenWay(from, to, chasesOf(reader, run), planeOf) : null
  if (chosen) return chosen
  if (from.levelId === to.levelId) return { alongMm: along(a.at, b.at), pathwayIds: [] }
  const nearest = shortestWay(from, to, reader.all('pathway'), planeOf)
  if (nearest) return nearest
  // No chase joins the levels: straight up or down at the rack, else at end a, then along.
  return { alongMm: along(a.at, b.at) + Math.abs(planeOf(from.levelId) - planeOf(to.levelId)), pathwayIds: [], straight: true }
}

const stopAt = (spot: EndSpot): Stop => ({ levelId: spot.level.id, at: spot.at })
const chasesOf = (reader: JobReader, run: Run) => run.pathwayIds.map((id) => reader.find('pathway', id)).filter((chase): chase is Pathway => chase !== undefined)

const planes = (reader: JobReader, run: Run) => (levelId: string) => {
  const level = reader.find('level', levelId)
  return level ? level.elevationMm + planeHeight(level, run) : 0
}

/** What is wrong with the chases a run is told to take, as a sentence; null: they lead from end to end, or there are none. */
export function strayChases(reader: JobReader, run: Run): string | null {
  if (!run.pathwayIds.length) return null
  const [a, b] = [endSpot(reader, run.a), endSpot(reader, run.b)]
  if (typeof a === 'string' || typeof b === 'string') return null
  const chases = chasesOf(reader, run)
  if (chosenWay(stopAt(a), stopAt(b), chases, planes(reader, run))) return null
  return `${chases.map((chase) => chase.name).join(', ')} ${chases.length === 1 ? 'does' : 'do'} not lead from ${a.level.name} to ${b.level.name}; the length is that of the nearest way.`
}

/** The way in words, end a first, for the inspector and the crew. */
function wordsOf(reader: JobReader, a: EndSpot, b: EndSpot, way: Way & { straight?: true }, run: Run): string[] {
  const plane = (level: Level) => (planeHeight(level, run) === 0 ? `${level.name} floor` : `${level.name} ceiling`)
  const start = a.atRack ? 'rack' : a.room.name
  const end = b.atRack ? 'rack' : b.room.name
  const chases = way.pathwayIds.map((id) => reader.find('pathway', id)?.name ?? 'chase')
  const between = a.level.id === b.level.id ? [plane(a.level)] : [plane(a.level), ...(way.straight ? [`straight ${b.level.elevationMm > a.level.elevationMm ? 'up' : 'down'}, no chase drawn`] : chases), plane(b.level)]
  return [start, ...between, end]
}
