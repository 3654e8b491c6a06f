import { spaceFit, type Occupancy } from '../calc/jacket/spaceFit.ts'
import type { JobReader } from '../derive/jobReader.ts'
import { lengthOf } from '../derive/lengthOf.ts'
import { endSpot } from '../routing/endSpot.ts'
import type { CableType } from '../model/cableType.ts'
import type { SpaceClass } from '../model/place.ts'
import type { Run } from '../model/run.ts'
import { defineCheck } from './define.ts'

export const jacketSpace = defineCheck({
  id: 'jacketSpace',
  title: 'Jacket and space',
  what: 'The fire rating and weather fitness of a jacket against the rooms at both ends and the way between levels; a dwelling for one or two families needs no riser marking',
  tier: 'code',
  source: 'NEC 725/722, 800, 820, 770: listing by space (excerpts and public tables of the 1996 to 2023 editions, not the official text). Local code and the licensed installer decide',
  about: 'run',
  limits: () => [{ severity: 'stop', text: 'jacket not for the space' }],
  look: (reader, run) => {
    const type = reader.find('cableType', run.cableTypeId)
    if (!type) return []
    const { occupancy } = reader.job().limits
    const spaces = spacesOf(reader, run, type)
    const wrong = spaces.flatMap(({ space, where }) => {
      const fit = fitIn(type, space, occupancy)
      return fit === null || fit.fits ? [] : [{ space, where, reason: fit.reason }]
    })
    const [worst] = wrong
    if (!worst) return []
    const stand = standIn(reader, type, spaces.map(({ space }) => space))
    const marked = type.jacketRating === 'none' ? 'with nothing' : type.jacketRating
    return [
      {
        severity: 'stop',
        aboutName: run.label,
        sentence: `${type.code} is marked ${marked}, and ${worst.where} is ${spaceWords[worst.space]}: ${worst.reason}.`,
        advice: stand ? `${stand.code} may lie there.` : 'Choose a cable that is listed for the space, or another way. Ask the local inspector.',
        basis: wrong.map(({ space, where, reason }) => `${where} (${space}): ${reason}`).join('; ') + `; jacket ${type.jacketRating}, building for ${occupancy}`,
        figures: [type.jacketRating, type.wet, type.outdoor, type.buried, occupancy, ...wrong.map(({ space }) => space)].join('|'),
        remedy: stand && { label: `Change to ${stand.code}`, intent: { verb: 'run.changeCable', args: { ids: [run.id], cableTypeId: stand.id } } },
      },
    ]
  },
})

const spaceWords: Record<SpaceClass, string> = { general: 'an ordinary room', riser: 'a way between floors', plenum: 'a space that carries air', wet: 'wet', outdoor: 'outdoors', buried: 'in the ground' }

const fitIn = (type: CableType, space: SpaceClass, occupancy: Occupancy) =>
  spaceFit({ marking: type.jacketRating, space, occupancy, outerDiameterMm: type.outerDiameterUm / 1000, isWetRated: type.wet, isOutdoorRated: type.outdoor, isBuriedRated: type.buried })

/**
 * Spaces that ask something of the jacket: the rooms at both ends and, where the run passes from level to level inside,
 * the way between (a chase, or straight through the floor). An ordinary room asks only for some listing. A cable made
 * for outside may come in a little way (NEC 800.48: 50 ft from where it enters, not into riser or plenum spaces), so it
 * is not asked there: how far it lies inside is not drawn, and a guess would be a warning on every garden run.
 */
function spacesOf(reader: JobReader, run: Run, type: CableType): { space: SpaceClass; where: string }[] {
  const spots = [run.a, run.b].map((end) => endSpot(reader, end)).filter((spot) => typeof spot !== 'string')
  const spaces: { space: SpaceClass; where: string }[] = []
  for (const { room } of spots) {
    const asks = room.spaceClass !== 'general' || (type.jacketRating === 'none' && !type.outdoor)
    if (asks && !spaces.some(({ space }) => space === room.spaceClass)) spaces.push({ space: room.spaceClass, where: room.name })
  }
  const [a, b] = spots
  const mayPass = type.outdoor && reader.job().limits.occupancy === 'one or two family'
  if (a && b && a.level.id !== b.level.id && a.level.use !== 'outside' && b.level.use !== 'outside' && !mayPass) {
    const chase = lengthOf(reader, run).length?.drawn?.pathwayIds[0]
    spaces.push({ space: 'riser', where: reader.find('pathway', chase)?.name ?? `the way from ${a.level.name} to ${b.level.name}` })
  }
  return spaces
}

/** A cable of the job of the same make-up that may lie in all of them. */
function standIn(reader: JobReader, type: CableType, spaces: readonly SpaceClass[]): CableType | null {
  const { occupancy } = reader.job().limits
  const isLike = (each: CableType) => each.id !== type.id && each.family === type.family && each.conductors === type.conductors && each.awg === type.awg && each.areaMm2 === type.areaMm2 && each.category === type.category
  return reader.all('cableType').find((each) => isLike(each) && spaces.every((space) => fitIn(each, space, occupancy)?.fits === true)) ?? null
}
