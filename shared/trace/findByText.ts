import type { Derived } from '../derive/deriveJob.ts'
import { find, type JobDocument } from '../model/jobDocument.ts'
import { isPanel, plateCode, portLabel, roomOfDevice, roomOfEnd, fieldEnd } from '../model/naming.ts'

/** Something that typed characters may mean. */
export type Found =
  | { readonly kind: 'run'; readonly id: string; readonly name: string; readonly about: string }
  | { readonly kind: 'plate'; readonly id: string; readonly name: string; readonly about: string }
  | { readonly kind: 'port'; readonly id: string; readonly terminal: string; readonly name: string; readonly about: string }
  | { readonly kind: 'device'; readonly id: string; readonly name: string; readonly about: string }
  | { readonly kind: 'room'; readonly id: string; readonly name: string; readonly about: string }

interface Entry {
  readonly found: Found
  /** The code as typed without signs; names are matched by their words. */
  readonly code: string
  readonly words: string
}

const plain = (text: string) => text.toUpperCase().replace(/[^A-Z0-9]/g, '')
const remembered = new WeakMap<JobDocument, readonly Entry[]>()

/**
 * What a person may mean by a few characters: a label, plate, port, device or room. Capitals, spaces and hyphens do not
 * matter. The best first: the whole code, then codes that begin so, then codes that hold it, then names.
 */
export function findByText(derived: Derived, text: string, most = 12): Found[] {
  const code = plain(text)
  const words = text.trim().toLowerCase()
  if (!code && !words) return []
  const ranked: { rank: number; entry: Entry }[] = []
  for (const entry of entriesOf(derived)) {
    const rank = rankOf(entry, code, words)
    if (rank !== null) ranked.push({ rank, entry })
  }
  return ranked
    .sort((a, b) => a.rank - b.rank || a.entry.found.name.length - b.entry.found.name.length || (a.entry.found.name < b.entry.found.name ? -1 : 1))
    .slice(0, most)
    .map(({ entry }) => entry.found)
}

function rankOf({ code: own, words: name }: Entry, code: string, words: string): number | null {
  if (code && own === code) return 0
  if (code && own.startsWith(code)) return 1
  if (code.length >= 2 && own.includes(code)) return 2
  if (words.length >= 2 && name.split(' ').some((word) => word.startsWith(words))) return 3
  return words.length >= 3 && name.includes(words) ? 4 : null
}

function entriesOf({ doc }: Derived): readonly Entry[] {
  let entries = remembered.get(doc)
  if (!entries) remembered.set(doc, (entries = [...buildEntries(doc)]))
  return entries
}

function* buildEntries(doc: JobDocument): Generator<Entry> {
  for (const run of doc.records.run.values()) {
    const room = roomOfEnd(doc, run[fieldEnd(doc, run)])
    const cable = find(doc, 'cableType', run.cableTypeId)?.code ?? ''
    yield { found: { kind: 'run', id: run.id, name: run.label, about: [cable, run.purpose, room?.name].filter(Boolean).join(' · ') }, code: plain(run.label), words: run.purpose.toLowerCase() }
  }
  for (const plate of doc.records.plate.values()) {
    const code = plateCode(doc, plate)
    yield { found: { kind: 'plate', id: plate.id, name: code, about: [plate.name, find(doc, 'room', plate.roomId)?.name].filter(Boolean).join(' · ') }, code: plain(code), words: plate.name.toLowerCase() }
  }
  for (const device of doc.records.device.values()) {
    const room = roomOfDevice(doc, device)
    yield { found: { kind: 'device', id: device.id, name: device.code ?? device.name, about: [device.code ? device.name : '', room?.name].filter(Boolean).join(' · ') }, code: plain(device.code ?? ''), words: device.name.toLowerCase() }
    if (!isPanel(doc, device)) continue
    for (const terminal of find(doc, 'deviceModel', device.modelId)?.terminals ?? []) {
      const name = portLabel(doc, device, terminal.key)
      yield { found: { kind: 'port', id: device.id, terminal: terminal.key, name, about: device.name }, code: plain(name), words: '' }
    }
  }
  for (const room of doc.records.room.values())
    yield { found: { kind: 'room', id: room.id, name: room.code, about: room.name }, code: plain(room.code), words: [room.name, ...room.aliases].join(' ').toLowerCase() }
}
