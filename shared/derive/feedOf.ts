import type { Run, RunEnd } from '../model/run.ts'
import { cordsOn, farEnd, runsOn, sourceEnd, terminalAt, type TerminalAt } from './ends.ts'
import type { JobReader } from './jobReader.ts'

/**
 * The amplifier's channel that feeds a loudspeaker run: at its source end, by a cord from there, or further up through
 * panels, speakers and volume controls. Undefined where none is drawn.
 */
export function feedOf(reader: JobReader, run: Run): TerminalAt | undefined {
  const seen = new Set<string>()
  return fromEnd(run[sourceEnd(reader, run)])

  function fromEnd(end: RunEnd | null): TerminalAt | undefined {
    if (!end || 'rackId' in end) return undefined
    if ('deviceId' in end) return end.terminal === null ? undefined : fromTerminal(end.deviceId, end.terminal)
    return end.jackId === null ? undefined : byCord({ plateId: end.plateId, jackId: end.jackId })
  }

  function fromTerminal(deviceId: string, key: string): TerminalAt | undefined {
    const at = terminalAt(reader, deviceId, key)
    if (!at || seen.has(`${deviceId} ${key}`)) return undefined
    seen.add(`${deviceId} ${key}`)
    if (at.category === 'panel') return byCord({ deviceId, terminal: key })
    if ((at.category === 'amplifier' || at.category === 'receiver') && at.terminal.direction !== 'in') return at
    const passes = reader.find('deviceModel', at.device.modelId)?.passes ?? []
    return first(passes.filter((pass) => pass.to === key), (pass) => intoTerminal({ deviceId, terminal: pass.from }))
  }

  function intoTerminal(at: { deviceId: string; terminal: string }): TerminalAt | undefined {
    return byCord(at) ?? first(runsOn(reader, at), ({ run: before, end }) => fromEnd(before[farEnd(end)]))
  }

  function byCord(at: { deviceId: string; terminal: string } | { plateId: string; jackId: string }): TerminalAt | undefined {
    return first(cordsOn(reader, at), ({ far }) => ('deviceId' in far ? fromTerminal(far.deviceId, far.terminal) : behindJack(far)))
  }

  function behindJack(jack: { plateId: string; jackId: string }): TerminalAt | undefined {
    const key = `${jack.plateId} ${jack.jackId}`
    if (seen.has(key)) return undefined
    seen.add(key)
    return first(runsOn(reader, jack), ({ run: before, end }) => (before.id === run.id ? undefined : fromEnd(before[farEnd(end)])))
  }
}

function first<T, R>(all: readonly T[], look: (each: T) => R | undefined): R | undefined {
  for (const each of all) {
    const seen = look(each)
    if (seen !== undefined) return seen
  }
  return undefined
}
