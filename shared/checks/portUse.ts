import { endKey } from '../derive/jobIndex.ts'
import type { JobReader } from '../derive/jobReader.ts'
import { runsOn } from '../derive/ends.ts'
import type { Cord, CordEnd, EndName, Run, RunEnd } from '../model/run.ts'
import { defineCheck, type Draft } from './define.ts'
import { endWords } from './endWords.ts'

const source = 'One cable lands on one port or jack: the trade’s practice, no source'

/** Whether an end names the very jack or terminal, and not just the plate or device. */
const isExact = (end: RunEnd) => ('plateId' in end && end.jackId !== null) || ('deviceId' in end && end.terminal !== null)

export const portUse = defineCheck({
  id: 'portUse',
  title: 'Ports and jacks',
  what: 'That no two runs land on one port, jack or terminal',
  tier: 'practice',
  source,
  about: 'run',
  limits: () => [{ severity: 'stop', text: 'more than 1 run a port' }],
  look: (reader, run) => (['a', 'b'] as const).flatMap((end) => shared(reader, run, end)),
})

/** Said of every run but the first one there, so that one mistake gives one finding. */
function shared(reader: JobReader, run: Run, end: EndName): Draft[] {
  const at = run[end]
  if (!at || !isExact(at) || run.dropped !== null) return []
  const here = runsOn(reader, at).map((each) => each.run)
  const first = [...here].sort((x, y) => x.serial - y.serial)[0]
  if (here.length < 2 || first?.id === run.id) return []
  const free = nextFree(reader, at)
  return [
    {
      severity: 'stop',
      aboutName: run.label,
      sentence: `${here.length === 2 ? 'Two' : here.length} runs land on ${endWords(reader, at)}: ${here.map((each) => each.label).join(' and ')}.`,
      advice: free ? `The next free one is ${endWords(reader, free)}.` : 'No other one is free there: add a panel or a jack.',
      figure: { value: here.length, unit: 'runs', text: `${here.length} runs` },
      limit: { value: 1, unit: 'run', text: '1 run', setBy: 'source' },
      basis: `${here.length} runs have an end at ${endWords(reader, at)}`,
      figures: [endKey(at), ...here.map((each) => each.id).sort()].join('|'),
      remedy: free && { label: `Move to ${endWords(reader, free)}`, intent: { verb: 'run.setEnd', args: { id: run.id, end, to: free } } },
    },
  ]
}

/** The next jack of the plate, or terminal of the device with the same signal, that no run has. */
function nextFree(reader: JobReader, at: RunEnd): RunEnd | null {
  if ('plateId' in at) {
    const plate = reader.find('plate', at.plateId)
    const taken = plate?.jacks.find((jack) => jack.id === at.jackId)
    const free = onward(plate?.jacks ?? [], taken).find((jack) => jack.connector === taken?.connector && !runsOn(reader, { plateId: at.plateId, jackId: jack.id }).length)
    return free ? { plateId: at.plateId, jackId: free.id } : null
  }
  if (!('deviceId' in at)) return null
  const model = reader.find('deviceModel', reader.find('device', at.deviceId)?.modelId)
  const taken = model?.terminals.find((terminal) => terminal.key === at.terminal)
  const free = onward(model?.terminals ?? [], taken).find((terminal) => terminal.signal === taken?.signal && terminal.direction === taken.direction && !runsOn(reader, { deviceId: at.deviceId, terminal: terminal.key }).length)
  return free ? { deviceId: at.deviceId, terminal: free.key } : null
}

/** Those after this position first, then the ones before it. */
const onward = <T extends { position: number }>(all: readonly T[], from: T | undefined): T[] =>
  [...all].sort((a, b) => Number(a.position < (from?.position ?? 0)) - Number(b.position < (from?.position ?? 0)) || a.position - b.position)

export const cordUse = defineCheck({
  id: 'cordUse',
  title: 'Cords',
  what: 'That no two cords are plugged into one front, and that a device’s terminal takes either a run or a cord',
  tier: 'practice',
  source,
  about: 'cord',
  limits: () => [{ severity: 'stop', text: 'more than 1 cord a port' }],
  look: (reader, cord) => [cord.a, cord.b].flatMap((end) => doubled(reader, cord, end)),
})

function doubled(reader: JobReader, cord: Cord, end: CordEnd): Draft[] {
  const cords = reader.under<Cord>(`cords on ${endKey(end)}`)
  const name = endWords(reader, end)
  if (cords.length > 1 && cords[0]!.id !== cord.id)
    return [
      {
        severity: 'stop',
        aboutName: name,
        sentence: `${cords.length} cords are plugged into ${name}.`,
        advice: 'Move one of them to a port of its own.',
        basis: `${cords.length} cords end at ${name}`,
        figures: [endKey(end), cords.length].join('|'),
      },
    ]
  const runs = isPanelFront(reader, end) ? [] : runsOn(reader, end)
  if (!runs.length) return []
  return [
    {
      severity: 'stop',
      aboutName: name,
      sentence: `${name} has a cord and the run ${runs[0]!.run.label} as well.`,
      advice: 'Take the cord off, or end the run at a plate or panel.',
      basis: 'A terminal of a device takes one plug',
      figures: [endKey(end), runs[0]!.run.id].join('|'),
    },
  ]
}

/** A jack and a panel port have a back for the run and a front for the cord. */
const isPanelFront = (reader: JobReader, end: CordEnd) => 'plateId' in end || reader.find('deviceModel', reader.find('device', end.deviceId)?.modelId)?.category === 'panel'
