import { find, recordsOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import { plateCode, portLabel } from '../../../../shared/model/naming.ts'
import type { Connector } from '../../../../shared/model/place.ts'
import type { CordEnd } from '../../../../shared/model/run.ts'
import { connectorWord, fits } from '../tools/connectors.ts'

/** Somewhere a cord may plug in, as one picks it from a list. */
export interface CordChoice {
  readonly key: string
  readonly group: string
  readonly code: string
  readonly name: string
  readonly to: CordEnd
}

const keyOf = (end: CordEnd) => ('plateId' in end ? `${end.plateId}/${end.jackId}` : `${end.deviceId}/${end.terminal}`)

/** Fronts that take a cord of this kind and have none yet: ports and devices in the same rack first, then plates, then all else. */
export function cordChoices(doc: JobDocument, deviceId: string, connector: Connector): CordChoice[] {
  const taken = new Set(recordsOf(doc, 'cord').flatMap((cord) => [keyOf(cord.a), keyOf(cord.b)]))
  const own = find(doc, 'device', deviceId)
  const devices = recordsOf(doc, 'device').filter((device) => device.id !== deviceId).flatMap((device) =>
    (find(doc, 'deviceModel', device.modelId)?.terminals ?? []).filter((terminal) => fits(terminal.connector, connector)).map((terminal): CordChoice => ({
      key: `${device.id}/${terminal.key}`, group: device.rackId !== null && device.rackId === own?.rackId ? 'In the same rack' : 'Elsewhere', code: portLabel(doc, device, terminal.key), name: device.name, to: { deviceId: device.id, terminal: terminal.key },
    })),
  )
  const plates = recordsOf(doc, 'plate').flatMap((plate) =>
    plate.jacks.filter((jack) => fits(jack.connector, connector)).map((jack): CordChoice => ({
      key: `${plate.id}/${jack.id}`, group: plate.id === own?.plateId ? 'At its own plate' : 'Plates', code: `${plateCode(doc, plate)} jack ${jack.position}`, name: connectorWord[jack.connector], to: { plateId: plate.id, jackId: jack.id },
    })),
  )
  const order = ['At its own plate', 'In the same rack', 'Plates', 'Elsewhere']
  return [...devices, ...plates].filter((choice) => !taken.has(choice.key)).sort((a, b) => order.indexOf(a.group) - order.indexOf(b.group))
}
