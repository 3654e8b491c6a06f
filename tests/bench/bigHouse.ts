import type { JobFixture } from '../../fixtures/jobs/jobFixture.ts'
import { startHouse } from '../../fixtures/jobs/houseBuilder.ts'

const letters = 'ABCDEFGHJKLMNPQRSTUVWXYZ'
const codeOf = (index: number) => `${letters[Math.floor(index / 576) % 24]}${letters[Math.floor(index / 24) % 24]}${letters[index % 24]}`

/** A house of any size for measuring: ten runs a room, on four levels, to panels in one rack room. */
export function bigHouse(runs: number): JobFixture {
  const house = startHouse({ id: `big-${runs}`, name: `House of ${runs}`, client: '', address: '', lengthUnit: 'ft', conductorUnit: 'awg' })
  const levels = ['L1', 'L2', 'L3', 'L4']
  levels.forEach((code, i) => house.level(code, `Level ${i + 1}`, { elevationFt: 11 * i, ceilingFt: 9 }))
  levels.slice(1).forEach((code, i) => house.chase(code, `Chase ${code}`, { xFt: 4, yFt: 4, from: levels[i]!, to: code }))
  house.room('RACK', 'Rack room', { level: 'L1', xFt: 0, yFt: 0, wFt: 10, dFt: 10 })
  const racks = Math.ceil(runs / 600)
  for (let i = 1; i <= racks; i++) house.rack(`RK${i}`, `Rack ${i}`, { room: 'RACK', xFt: 2 + (i % 5), yFt: 2, units: 60 })
  const panels = { speaker: [] as string[], data: [] as string[] }
  for (let i = 1; i <= Math.ceil(runs / 40); i++) {
    const rack = `RK${1 + (i % racks)}`
    house.device(`SP${i}`, 'panel-speaker-24', `Speaker panel ${i}`, { rack, unit: 1 + (i % 50) })
    house.device(`PP${i}`, 'panel-data-24', `Patch panel ${i}`, { rack, unit: 1 + (i % 50) })
    for (let port = 1; port <= 24; port++) {
      panels.speaker.push(`SP${i}.${port}`)
      panels.data.push(`PP${i}.${port}`)
    }
  }
  for (let i = 1; i <= Math.ceil(runs / 20); i++) house.device(`AMP${i}`, 'amp-12', `Amplifier ${i}`, { rack: `RK${1 + (i % racks)}`, unit: 1 + (i % 50) })
  house.part('Draw the house')
  for (let room = 0; room < Math.ceil(runs / 10); room++) {
    const code = codeOf(room)
    house.room(code, `Room ${code}`, { level: levels[room % 4]!, xFt: 12 + 12 * (Math.floor(room / 4) % 8), yFt: 12 * (Math.floor(room / 32) % 4), wFt: 12, dFt: 12 })
    for (let i = 1; i <= 10 && room * 10 + i <= runs; i++) {
      const plate = `${code}${i}`
      const speaker = i % 2 === 0
      house.plate(plate, speaker ? 'Speaker' : 'Data', 'wall-box', { wall: (['N', 'E', 'S', 'W'] as const)[i % 4]!, ft: 1 + i, inUp: 16 }, [speaker ? 'speaker-pair' : 'modular'])
      if (speaker) house.device(`${plate}D`, 'speaker-in-wall-8', 'Speaker', { plate })
      house.run(plate, speaker ? '14/2' : 'CAT6', (speaker ? panels.speaker : panels.data).shift() ?? '', `${plate}/1`, { purpose: speaker ? 'Speaker' : 'Data', bundle: code })
    }
    if (room % 20 === 19) house.part(`Lay out to ${code}`)
  }
  return house.finish()
}
