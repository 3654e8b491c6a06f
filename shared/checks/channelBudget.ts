import type { JobReader } from '../derive/jobReader.ts'
import { endRoom, farEnd, rackOf, sourceEnd, terminalAt } from '../derive/ends.ts'
import { feedOf } from '../derive/feedOf.ts'
import { countWord, pairsOf, speakerLoad } from '../derive/speakerLoad.ts'
import { isSpeakerSignal } from '../derive/speakersReached.ts'
import type { CableType } from '../model/cableType.ts'
import type { Device } from '../model/device.ts'
import type { Rack } from '../model/place.ts'
import type { Run } from '../model/run.ts'
import { defineCheck } from './define.ts'

/** A run from a head end to speakers, and the channels it takes. */
interface Demand {
  readonly run: Run
  readonly channels: number
  readonly roomId: string
  readonly roomName: string
  /** A cord or a terminal of an amplifier is drawn for it already. */
  readonly isLanded: boolean
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
    // Without any amplifier drawn nothing is claimed: the head end is not planned yet.
    if (offered === 0) return []
    const asked = [...racks.map((rack) => `rack:${rack.id}`), ...devices.map((device) => `device:${device.id}`)].flatMap((place) => demandsAt(reader, place))
    const total = asked.reduce((sum, each) => sum + each.channels, 0)
    if (total <= offered) return []
    const silent = leftOver(asked, offered)
    const rooms = [...new Set(silent.map((each) => each.roomName))].join(', ')
    return [
      {
        severity: 'stop',
        aboutName: room.name,
        sentence: `${total} speaker channels are wired to ${room.name}, and its amplifiers have ${offered}. Left silent: ${silent.map((each) => each.run.label).join(', ')}${rooms ? ` (${rooms})` : ''}.`,
        advice: `Add an amplifier of at least ${countWord(total - offered)} ${total - offered === 1 ? 'channel' : 'channels'}, or give up zones.`,
        figure: { value: total, unit: 'channels', text: `${total} channels` },
        limit: { value: offered, unit: 'channels', text: `${offered} channels`, setBy: 'source' },
        basis: `${asked.length} speaker runs ask for ${total} channels: one a pair of conductors, one a constant-voltage line; ${offered} channels on ${racks.length === 1 ? '1 rack' : `${racks.length} racks`}`,
        figures: [total, offered, ...silent.map((each) => each.run.id)].join('|'),
      },
    ]
  },
})

const channelsOffered = (reader: JobReader, device: Device): number => {
  const model = reader.find('deviceModel', device.modelId)
  if (!model || (model.category !== 'amplifier' && model.category !== 'receiver')) return 0
  return model.terminals.filter((terminal) => terminal.direction === 'out' && (terminal.signal === 'speaker' || terminal.signal === 'speaker-line')).length
}

/** What runs from one rack or one device in it ask for. Remembered by place, so that an edit to a run counts one panel anew. */
const demandsAt = (reader: JobReader, place: string): readonly Demand[] =>
  reader.remember('demands', place, () => reader.under<Run>(`runs at ${place}`).flatMap((run) => demandOf(reader, run, place)))

function demandOf(reader: JobReader, run: Run, place: string): Demand[] {
  const type = reader.find('cableType', run.cableTypeId)
  if (!type || type.family !== 'speaker' || run.dropped !== null) return []
  const source = sourceEnd(reader, run)
  const near = run[source]
  // Said once, at the place the signal comes from; a run that only comes back to the rack asks for nothing more.
  const isHere = near && rackOf(reader, near) !== undefined && ('rackId' in near ? `rack:${near.rackId}` : 'deviceId' in near ? `device:${near.deviceId}` : '') === place
  const channels = isHere ? channelsAsked(reader, run, type) : 0
  if (channels === 0) return []
  const room = endRoom(reader, run[farEnd(source)])
  return [{ run, channels, roomId: room?.id ?? '', roomName: room?.name ?? '', isLanded: feedOf(reader, run) !== undefined }]
}

/** Channels that a run asks for: by its load; where no speaker is drawn yet, by the speaker jack or terminal it goes to. */
function channelsAsked(reader: JobReader, run: Run, type: CableType): number {
  const { load, missing } = speakerLoad(reader, run)
  if (load) return load.lineVoltageV === null ? pairsOf(type) : 1
  const source = sourceEnd(reader, run)
  const [near, far] = [run[source], run[farEnd(source)]]
  const from = near && 'deviceId' in near ? terminalAt(reader, near.deviceId, near.terminal)?.terminal.signal : undefined
  if (from !== undefined && !isSpeakerSignal(from)) return 0
  const isForSpeakers = missing !== null || isSpeakerEnd(reader, far)
  return !isForSpeakers ? 0 : from === 'speaker-line' ? 1 : pairsOf(type)
}

function isSpeakerEnd(reader: JobReader, end: Run['b']): boolean {
  if (!end || 'rackId' in end) return false
  if ('plateId' in end) return reader.find('plate', end.plateId)?.jacks.find((jack) => jack.id === end.jackId)?.connector === 'speaker-pair'
  const at = terminalAt(reader, end.deviceId, end.terminal)
  return at !== undefined && isSpeakerSignal(at.terminal.signal)
}

/**
 * Which runs go without when channels run out: a room with many keeps its own and the smaller ones give way, as a second
 * zone does on a receiver; in a room those go first that no cord is drawn for.
 */
function leftOver(asked: readonly Demand[], offered: number): Demand[] {
  const byRoom = new Map<string, number>()
  for (const { roomId, channels } of asked) byRoom.set(roomId, (byRoom.get(roomId) ?? 0) + channels)
  const order = [...asked].sort(
    (a, b) => byRoom.get(b.roomId)! - byRoom.get(a.roomId)! || (a.roomId < b.roomId ? -1 : a.roomId > b.roomId ? 1 : 0) || Number(b.isLanded) - Number(a.isLanded) || a.run.serial - b.run.serial,
  )
  let left = offered
  const silent: Demand[] = []
  for (const demand of order) {
    if (demand.channels <= left) left -= demand.channels
    else silent.push(demand)
  }
  return silent
}
