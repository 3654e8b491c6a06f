import { z } from 'zod'
import { commandSchema, type Command } from '../commands/index.ts'
import { idSchema } from '../model/fields.ts'
import { jobSchema } from '../model/job.ts'
import type { JobRecord } from '../model/record.ts'
import type { Role } from '../policy.ts'
import type { Severity } from '../checks/finding.ts'
import type { Progress } from '../derive/facts.ts'
import type { Change } from '../sync/change.ts'

/** Most commands one request may carry; a longer queue is sent in pieces. */
export const maxCommandsPerPush = 500
/** Most log entries one answer carries; whoever is further behind asks again from the last it got. */
export const maxEntriesPerAnswer = 400

/** GET /api/jobs/:jobId and what hangs below it. */
export const jobParamsSchema = z.strictObject({ jobId: idSchema })

/** POST /api/jobs: the short form. The rest of the job's own record comes from the company's rules. */
export const createJobSchema = z.strictObject({
  id: idSchema,
  name: jobSchema.shape.name,
  client: jobSchema.shape.client.default(''),
  address: jobSchema.shape.address.default(''),
  lengthUnit: jobSchema.shape.lengthUnit.optional(),
  conductorUnit: jobSchema.shape.conductorUnit.optional(),
})
export type CreateJob = z.input<typeof createJobSchema>

/** The answer to creating a job: where it stands now. */
export interface JobCreated {
  readonly id: string
  readonly version: number
}

/** What follows from a job's document, in short. */
export interface JobStanding {
  readonly progress: Progress
  /** Findings that stand, by severity; those somebody accepted are not counted. */
  readonly findings: Readonly<Record<Severity, number>>
}

/** One line of the list of jobs. */
export interface JobSummary {
  readonly id: string
  readonly name: string
  readonly client: string
  readonly address: string
  readonly version: number
  /** When it was created, UTC. */
  readonly createdAt: string
  readonly levels: number
  /** Runs on the job, those dropped included. */
  readonly runs: number
  /** The last command accepted, or the making of the job: who, what, and when by the server's clock. */
  readonly lastWord: { readonly byId: string; readonly byName: string; readonly label: string; readonly at: string }
  /** Null while it is still being worked out: ask again shortly. */
  readonly standing: JobStanding | null
}

/** GET /api/jobs: every job of the company, the one last worked on first. */
export interface JobList {
  readonly jobs: readonly JobSummary[]
}

/** Somebody whose name may stand beside a record or a log entry, those no longer with the company included. */
export interface JobMember {
  readonly id: string
  readonly name: string
  readonly role: Role
}

/** GET /api/jobs/:jobId: the whole document, parents before children, in the order records were added. */
export interface JobOpened {
  readonly version: number
  readonly records: readonly JobRecord[]
  readonly members: readonly JobMember[]
}

/** A command the server accepted, and what it did. */
export interface LogEntry {
  readonly version: number
  readonly commandId: string
  readonly actorId: string
  readonly verb: string
  /** What it was called when it was made: "Change 4 runs to 14/2". */
  readonly label: string
  /** When it was accepted, UTC, by the server's clock. */
  readonly at: string
  readonly change: Change
}

/** POST /api/jobs/:jobId/commands */
export const pushSchema = z.strictObject({
  /** The version the sender has confirmed: the answer tells what came after it. */
  baseVersion: z.int().min(0),
  commands: z.array(commandSchema).max(maxCommandsPerPush, `At most ${maxCommandsPerPush} commands at once`),
})
export interface Push {
  readonly baseVersion: number
  readonly commands: readonly Command[]
}

export interface RefusedCommand {
  readonly commandId: string
  /** A code of shared/errors: conflict, refused, forbidden, not_found, invalid. */
  readonly code: string
  /** A sentence for a person. */
  readonly message: string
  /** For a conflict: ConflictDetails, with both values and who wrote the other. */
  readonly details: unknown
}

/** What has happened to a job after a version. */
export interface Changes {
  /** The job's version now. Where the last entry of `since` is older, ask for the changes after that entry. */
  readonly version: number
  readonly since: readonly LogEntry[]
}

export interface PushAnswer extends Changes {
  /** Commands of this request that are in the log, now or already before. With those refused they are all settled. */
  readonly accepted: readonly { readonly commandId: string; readonly version: number }[]
  readonly refused: readonly RefusedCommand[]
}

/** GET /api/jobs/:jobId/changes?since=40 */
export const changesQuerySchema = z.strictObject({ since: z.coerce.number().int().min(0).max(Number.MAX_SAFE_INTEGER) })

/** Each event of GET /api/jobs/:jobId/events: a number only. Rights are checked when the changes are fetched. */
export const versionEventSchema = z.strictObject({ version: z.int().min(0) })
export type VersionEvent = z.infer<typeof versionEventSchema>
