import { find, recordsOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import { plateCode, portLabel } from '../../../../shared/model/naming.ts'
import type { Connector } from '../../../../shared/model/place.ts'
import type { RunEnd } from '../../../../shared/model/run.ts'
import { connectorWord, fits } from '../tools/connectors.ts'

/** Somewhere a run may end, as one picks it from a list. */
export interface EndChoice {
  readonly key: string
  readonly group: string
  readonly code: string
  readonly name: string
  readonly to: RunEnd | null
}

/** Every jack, port and terminal that a cable fits and nobody has, then racks with the port left open, and no end at all. */
export function endChoices(doc: JobDocument, connector: Connector, exceptRunId: string): EndChoice[] {
  const taken = new Set<string>()
  for (const run of doc.records.run.values())
    if (run.id !== exceptRunId)
      for (const end of [run.a, run.b]) {
        if (end && 'plateId' in end && end.jackId) taken.add(end.jackId)
        if (end && 'deviceId' in end && end.terminal) taken.add(`${end.deviceId}:${end.terminal}`)
      }
  const rooms = new Map(recordsOf(doc, 'room').map((room) => [room.id, room.name]))
  const jacks = recordsOf(doc, 'plate').flatMap((plate) =>
    plate.jacks.filter((jack) => fits(jack.connector, connector) && !taken.has(jack.id)).map((jack): EndChoice => ({
      key: jack.id, group: 'Plates', code: plateCode(doc, plate), name: `jack ${jack.position}, ${connectorWord[jack.connector]}, ${plate.name || rooms.get(plate.roomId) || ''}`, to: { plateId: plate.id, jackId: jack.id },
    })),
  )
  const ports = recordsOf(doc, 'device').flatMap((device) =>
    (find(doc, 'deviceModel', device.modelId)?.terminals ?? []).filter((terminal) => fits(terminal.connector, connector) && !taken.has(`${device.id}:${terminal.key}`)).map((terminal): EndChoice => ({
      key: `${device.id}:${terminal.key}`, group: device.rackId ? 'Ports in racks' : 'Devices', code: device.rackId ? portLabel(doc, device, terminal.key) : device.name, name: device.rackId ? device.name : terminal.name, to: { deviceId: device.id, terminal: terminal.key },
    })),
  )
  const racks = recordsOf(doc, 'rack').map((rack): EndChoice => ({ key: rack.id, group: 'Racks', code: rack.code, name: `${rack.name}, port still open`, to: { rackId: rack.id } }))
  const order = ['Ports in racks', 'Plates', 'Devices']
  return [...[...jacks, ...ports].sort((a, b) => order.indexOf(a.group) - order.indexOf(b.group)), ...racks, { key: 'none', group: 'None', code: 'none', name: 'no end yet', to: null }]
}
