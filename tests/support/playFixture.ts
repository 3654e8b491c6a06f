import type { JobFixture } from '../../fixtures/jobs/jobFixture.ts'
import type { Command } from '../../shared/commands/index.ts'
import { buildDocument, type JobDocument } from '../../shared/model/jobDocument.ts'
import { replay } from '../../shared/sync/replay.ts'
import { buildJob } from './build.ts'

/** The job that a fixture's commands make, played in memory. Throws when one is refused: a fixture is a story that works. */
export function playFixture(fixture: JobFixture): JobDocument {
  const { id, name, client, address, lengthUnit, conductorUnit } = fixture
  let doc = buildDocument(id, 0, [buildJob({ id, name, client, address, lengthUnit, conductorUnit })])
  for (const [index, { as, intent }] of fixture.commands.entries()) {
    const command = { ...intent, id: `${id}-${index}`, madeAt: index } as Command
    const played = replay(doc, [command], { actor: { id: as, role: as }, changeOf: () => undefined })
    const [refusal] = played.refused
    if (refusal) throw new Error(`${name}, command ${index} (${command.verb}): ${refusal.error.message} ${JSON.stringify(refusal.error.details ?? '')}`)
    doc = { ...played.doc, version: index + 1 }
  }
  return doc
}
