import { sourceEnd } from '../derive/ends.ts'
import type { JobReader } from '../derive/jobReader.ts'
import { pairsOf, speakerLoad } from '../derive/speakerFacts.ts'
import type { Device } from '../model/device.ts'
import type { Rack } from '../model/place.ts'
import type { Run } from '../model/run.ts'
import { roomOfEnd } from '../model/naming.ts'
import { defineCheck } from './define.ts'

/** A run from a head end to speakers, and the channels it takes. */
interface Demand {
  readonly run: Run
  readonly channels: number
  readonly roomId: string
}

export const channelBudget = defineCheck({
  id: 'channelBudget',
  title: 'Amplifier channels',
  what: 'The channels that loudspeaker runs to a head end ask for, against those its amplifiers have: one a pair of conductors, one a constant-voltage line',
  tier: 'practice',
  source: 'Channels are a budget: common practice, no source',
  about: 'room',
  limits: () => [{ severity: 'stop', text: 'more channels wired than there are' }],
  look: (reader, room) => {
    const racks = reader.under<Rack>(`racks in ${room.id}`)
    if (!racks.length) return []
    const devices = racks.flatMap((rack) => reader.under<Device>(`devices at rack:${rack.id}`))
    const offered = devices.reduce((sum, device) => sum + channelsOffered(reader, device), 0)
    const demands = racks.flatMap((rack) => reader.under<Run>(`runs at rack:${rack.id}`)).concat(devices.flatMap((device) => reader.under<Run>(`runs at device:${device.id}`)))
    const asked = [...new Map(demands.map((run) => [run.id, run])).values()].flatMap((run) => demandOf(reader, run))
    const total = asked.reduce((sum, each) => sum + each.channels, 0)
    // Without any amplifier drawn nothing is claimed: the head end is not planned yet.
    if (offered === 0 || total <= offered) return []
    const silent = leftOver(asked, offered)
    return [
      {
        severity: 'stop',
        aboutName: room.name,
        sentence: `${total} speaker channels are wired to ${room.name}, and its amplifiers have ${offered}. Left silent: ${silent.map((run) => run.label).join(', ')}.`,
        advice: `Add an amplifier of at least ${total - offered} channels, or give up zones.`,
        figure: { value: total, unit: 'channels', text: `${total} channels` },
        limit: { value: offered, unit: 'channels', text: `${offered} channels`, setBy: 'source' },
        basis: `${asked.length} speaker runs, ${total} channels; ${offered} channels on ${racks.length === 1 ? '1 rack' : `${racks.length} racks`}`,
        figures: [total, offered].join('|'),
      },
    ]
  },
})

function channelsOffered(reader: JobReader, device: Device): number {
  const model = reader.find('deviceModel', device.modelId)
  if (!model || (model.category !== 'amplifier' && model.category !== 'receiver')) return 0
  return model.terminals.filter((terminal) => terminal.direction === 'out' && (terminal.signal === 'speaker' || terminal.signal === 'speaker-line')).length
}

function demandOf(reader: JobReader, run: Run): Demand[] {
  const type = reader.find('cableType', run.cableTypeId)
  if (!type || type.family !== 'speaker' || run.dropped !== null) return []
  const load = speakerLoad(reader, run, type)
  if (!load) return []
  const far = run[sourceEnd(reader, run) === 'a' ? 'b' : 'a']
  return [{ run, channels: load.lineVoltageV === null ? pairsOf(type) : 1, roomId: roomOfEnd(reader.doc, far)?.id ?? '' }]
}

/** Which runs go without when channels run out: the room with the most keeps its own, the smaller ones give way. */
function leftOver(asked: readonly Demand[], offered: number): Run[] {
  const byRoom = new Map<string, number>()
  for (const { roomId, channels } of asked) byRoom.set(roomId, (byRoom.get(roomId) ?? 0) + channels)
  const order = [...asked].sort((a, b) => byRoom.get(b.roomId)! - byRoom.get(a.roomId)! || a.roomId.localeCompare(b.roomId) || a.run.serial - b.run.serial)
  let left = offered
  const silent: Run[] = []
  for (const { run, channels } of order) {
    if (channels <= left) left -= channels
    else silent.push(run)
  }
  return silent
}
