import { spaceFit, type Occupancy } from '../calc/jacket/spaceFit.ts'
import type { JobReader } from '../derive/jobReader.ts'
import { factsOf } from '../derive/runFacts.ts'
import { endSpot } from '../routing/endSpot.ts'
import type { CableType } from '../model/cableType.ts'
import type { SpaceClass } from '../model/place.ts'
import type { Run } from '../model/run.ts'
import { defineCheck } from './define.ts'

export const jacketSpace = defineCheck({
  id: 'jacketSpace',
  title: 'Jacket and space',
  what: 'The fire rating and weather fitness of a jacket against the rooms at both ends and a chase between levels',
  tier: 'code',
  source: 'NEC 725/722, 800, 820, 770: listing by space (excerpts and public tables of the 1996 to 2023 editions, not the official text). Local code and the licensed installer decide',
  about: 'run',
  limits: () => [{ severity: 'stop', text: 'jacket not for the space' }],
  look: (reader, run) => {
    const type = reader.find('cableType', run.cableTypeId)
    if (!type) return []
    const { occupancy } = reader.job().limits
    for (const { space, where } of spacesOf(reader, run, type)) {
      const fit = fitIn(type, space, occupancy)
      if (fit === null || fit.fits) continue
      const stand = standIn(reader, type, space)
      return [
        {
          severity: 'stop',
          aboutName: run.label,
          sentence: `${type.code} is marked ${type.jacketRating === 'none' ? 'with nothing' : type.jacketRating}, and ${where} is ${spaceWords[space]}: ${fit.reason}.`,
          advice: stand ? `${stand.code} may lie there.` : 'Choose a cable that is listed for the space, or another way. Ask the local inspector.',
          figure: null,
          limit: null,
          basis: `jacket ${type.jacketRating}, space ${space}, ${occupancy}`,
          figures: [type.jacketRating, type.wet, type.outdoor, type.buried, space, occupancy].join('|'),
          remedy: stand && { label: `Change to ${stand.code}`, intent: { verb: 'run.changeCable', args: { ids: [run.id], cableTypeId: stand.id } } },
        },
      ]
    }
    return []
  },
})

const spaceWords: Record<SpaceClass, string> = { general: 'an ordinary room', riser: 'a way between floors', plenum: 'a space that carries air', wet: 'wet', outdoor: 'outdoors', buried: 'in the ground' }

const fitIn = (type: CableType, space: SpaceClass, occupancy: Occupancy) =>
  spaceFit({ marking: type.jacketRating, space, occupancy, outerDiameterMm: type.outerDiameterUm / 1000, isWetRated: type.wet, isOutdoorRated: type.outdoor, isBuriedRated: type.buried })

/**
 * Spaces that ask something of the jacket. An ordinary room asks only for some listing, and a cable made for outside may
 * come in a little way (the 50 ft rule), so it is not asked there.
 */
function spacesOf(reader: JobReader, run: Run, type: CableType): { space: SpaceClass; where: string }[] {
  const spaces: { space: SpaceClass; where: string }[] = []
  for (const end of [run.a, run.b]) {
    const spot = endSpot(reader, end)
    if (typeof spot === 'string') continue
    const { spaceClass, name } = spot.room
    if (spaceClass !== 'general' || (type.jacketRating === 'none' && !type.outdoor)) spaces.push({ space: spaceClass, where: name })
  }
  const { length } = factsOf(reader, run)
  const chase = length?.drawn?.pathwayIds[0]
  if (chase && !type.outdoor) spaces.push({ space: 'riser', where: reader.find('pathway', chase)?.name ?? 'the chase' })
  return spaces
}

/** A cable of the job of the same make-up that may lie there. */
function standIn(reader: JobReader, type: CableType, space: SpaceClass): CableType | null {
  const { occupancy } = reader.job().limits
  const fits = (each: CableType) => fitIn(each, space, occupancy)?.fits === true
  return reader.all('cableType').find((each) => each.id !== type.id && each.family === type.family && each.conductors === type.conductors && each.awg === type.awg && each.category === type.category && fits(each)) ?? null
}
