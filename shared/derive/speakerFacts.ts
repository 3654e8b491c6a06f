import { conductorResistanceOhmPerKm } from '../calc/conductor/resistance.ts'
import { lineLoss, loopResistanceOhm } from '../calc/speaker/lineLoss.ts'
import { lineNode, totalRatio, type LineLeg, type LineNode } from '../calc/speaker/lineTree.ts'
import { parallelOhm } from '../calc/speaker/load.ts'
import type { CableType } from '../model/cableType.ts'
import type { Run } from '../model/run.ts'
import type { LossFigures, SpeakerFacts } from './facts.ts'
import type { JobReader } from './jobReader.ts'
import { lengthOf } from './lengthOf.ts'
import { speakerLoad, type LoadedSpeaker, type SpeakerLoad } from './speakerLoad.ts'

/** Resistance of one conductor of a type at the job's temperature, ohm/km; null: its size is not known. */
export const conductorOhmPerKm = (type: CableType, temperatureC: number): number | null =>
  conductorResistanceOhmPerKm({ awg: type.awg, areaMm2: type.areaMm2, stranding: type.stranding, material: type.material, statedOhmPerKm: type.resistanceOhmPerKm }, temperatureC)

/** Loop resistance of a run at its length, ohm; null: length or size is not known. */
function loopOf(reader: JobReader, run: Run): number | null {
  const type = reader.find('cableType', run.cableTypeId)
  const { length } = lengthOf(reader, run)
  const ohmPerKm = type ? conductorOhmPerKm(type, reader.job().limits.conductorTemperatureC) : null
  return length && ohmPerKm !== null ? loopResistanceOhm(length.totalMm / 1000, ohmPerKm) : null
}

/**
 * What a loudspeaker run loses at its length into the load as the amplifier sees it; and, where legs come after it (hops
 * of a line, what goes on from a volume control), what is lost with them at the speaker that gets least. Null where it
 * feeds no speaker, or length, load or conductor is not known.
 */
export function speakerFacts(reader: JobReader, run: Run): SpeakerFacts | null {
  const loop = loopOf(reader, run)
  const { load } = speakerLoad(reader, run)
  const tappedOhm = load?.lineVoltageV == null ? load?.loadOhm : parallelOhm(load.pairs.flat().map((speaker) => speaker.ohm))
  const own = loop === null || tappedOhm == null ? null : figuresOf(loop, tappedOhm)
  if (!load || loop === null || !own) return null
  const uncounted = new Set<string>()
  let worst: { ratio: number; node: LineNode } | null = null
  for (const pair of load.pairs) {
    const node = nodeOf(reader, run, load, pair, uncounted)
    const ratio = node && totalRatio(loop, node)
    if (node && ratio !== null && (!worst || ratio > worst.ratio)) worst = { ratio, node }
  }
  if (!worst) return null
  return {
    loadOhm: load.loadOhm, loadText: load.text, lineVoltageV: load.lineVoltageV, assumed: load.assumed, loopResistanceOhm: loop, ...own,
    behindOhm: worst.node.behindOhm, onwardFactor: worst.node.worstFactor, uncounted: [...uncounted].sort(),
    withLegs: worst.node.worstFactor > 1 ? figuresOf(worst.ratio, 1) : null,
  }
}

function figuresOf(loopOhm: number, loadOhm: number): LossFigures | null {
  const loss = lineLoss(loopOhm, loadOhm)
  return loss && { lossDb: loss.decibel, impedancePercent: loss.impedance, voltagePercent: loss.voltage, powerPercent: loss.power }
}

/** A run's end seen from its beginning, for one pair of conductors. */
function nodeOf(reader: JobReader, run: Run, load: SpeakerLoad, pair: readonly LoadedSpeaker[], uncounted: Set<string>): LineNode | null {
  const legLoop = (leg: Run) => {
    const loop = loopOf(reader, leg)
    if (loop === null) uncounted.add(leg.label)
    return loop ?? 0
  }
  if (run.loadJoin === 'series' && load.lineVoltageV === null) return seriesNode(pair, legLoop)
  const treeFrom = (depth: number, speakers: readonly LoadedSpeaker[]): Pick<LineLeg, 'loadsOhm' | 'onward'> => ({
    loadsOhm: speakers.filter((speaker) => speaker.runs.length === depth).map((speaker) => speaker.ohm),
    onward: legsAt(depth, speakers).map(({ leg, behind }) => ({ loopOhm: legLoop(leg), ...treeFrom(depth + 1, behind) })),
  })
  return lineNode(treeFrom(1, pair))
}

/** The legs that go on after this many, each with the speakers behind it. */
function legsAt(depth: number, speakers: readonly LoadedSpeaker[]): { leg: Run; behind: LoadedSpeaker[] }[] {
  const legs = new Map<string, { leg: Run; behind: LoadedSpeaker[] }>()
  for (const speaker of speakers) {
    const leg = speaker.runs[depth]
    if (!leg) continue
    const known = legs.get(leg.id)
    if (known) known.behind.push(speaker)
    else legs.set(leg.id, { leg, behind: [speaker] })
  }
  return [...legs.values()]
}

/** In series one current goes through every leg and every speaker: all loops add up against all loads. */
function seriesNode(pair: readonly LoadedSpeaker[], legLoop: (leg: Run) => number): LineNode | null {
  const legs = new Map(pair.flatMap((speaker) => speaker.runs.slice(1)).map((leg) => [leg.id, leg]))
  const loops = [...legs.values()].reduce((sum, leg) => sum + legLoop(leg), 0)
  const loads = pair.reduce((sum, speaker) => sum + speaker.ohm, 0)
  return lineNode({ loadsOhm: [], onward: [{ loopOhm: loops, loadsOhm: [loads], onward: [] }] })
}
