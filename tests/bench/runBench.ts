import { startBenchWorld } from './benchWorld.ts'
import { deriveBench } from './deriveBench.ts'
import { exportBench } from './exportBench.ts'
import { httpBench, httpStories } from './httpBench.ts'
import type { Row } from './measure.ts'
import { panBench, panStories } from './panBench.ts'

interface Aim {
  /** Whether the ratio may be at most this, or must be at least this. */
  readonly ratio?: readonly ['most' | 'least', number]
  readonly exponent?: number
}

const aims: Readonly<Record<string, Aim>> = {
  'recompute-whole': { exponent: 1.1 },
  'recompute-edit': { ratio: ['most', 1 / 20] },
  'http-open': { ratio: ['least', 0.65] },
  'http-command': { ratio: ['least', 0.6] },
  xlsx: { ratio: ['most', 1.3] },
  'labels-pdf': { ratio: ['most', 1.5] },
  'riser-pan-60': { ratio: ['most', 2] },
  'riser-pan-600': { ratio: ['most', 2] },
}

const say = (line: string) => void process.stderr.write(`${line}\n`)

/** Every part in turn, so that none takes the machine from another. */
async function runAll(): Promise<Row[]> {
  say('Deriving')
  const rows = await deriveBench()
  say('Writing files')
  rows.push(...(await exportBench()))
  const world = await startBenchWorld([...httpStories(), ...panStories()], say)
  // Whoever breaks it off leaves no server behind.
  const breakOff = () => void world.stop().finally(() => process.exit(130))
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.once(signal, breakOff)
  try {
    rows.push(...(await httpBench(world, say)), ...(await panBench(world, say)))
  } finally {
    await world.stop()
  }
  return rows
}

function verdict({ name, ratio, exponent }: Row): string {
  const aim = aims[name]
  if (!aim) return ''
  const said: string[] = []
  if (aim.ratio) {
    const [bound, value] = aim.ratio
    said.push(`ratio at ${bound} ${value}: ${(bound === 'most' ? ratio <= value : ratio >= value) ? 'met' : 'missed'}`)
  }
  if (aim.exponent !== undefined) said.push(`exponent at most ${aim.exponent}: ${exponent !== undefined && exponent <= aim.exponent ? 'met' : 'missed'}`)
  return said.join(', ')
}

function table(rows: readonly Row[]): string {
  const cells = [
    ['name', 'ours', 'reference', 'ratio', 'exponent', 'aim', 'unit'],
    ...rows.map((row) => [row.name, row.ours.toFixed(1), row.reference.toFixed(1), row.ratio.toFixed(3), row.exponent?.toFixed(2) ?? '', verdict(row), row.unit]),
  ]
  const widths = cells[0]!.map((_, column) => Math.max(...cells.map((line) => line[column]!.length)))
  return cells.map((line) => line.map((cell, column) => cell.padEnd(widths[column]!)).join('  ').trimEnd()).join('\n')
}

const rows = await runAll()
console.log(process.argv.includes('--json') ? JSON.stringify(rows, null, 2) : table(rows))
