import type { JobStanding } from '../../../shared/api/jobs.ts'
import type { JobDocument } from '../../../shared/model/jobDocument.ts'

export const standingOf = (_doc: JobDocument): JobStanding | null => null
