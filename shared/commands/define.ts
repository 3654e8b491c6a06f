import { z } from 'zod'
import { idSchema } from '../model/fields.ts'
import { need, type JobDocument } from '../model/jobDocument.ts'
import type { Kind, RecordOf } from '../model/record.ts'
import type { Role } from '../policy.ts'
import { updates, type Change } from '../sync/change.ts'
import { compose } from '../sync/compose.ts'

export interface Actor {
  /** The member's id. */
  readonly id: string
  readonly role: Role
}

export interface PlanContext {
  readonly actor: Actor
  readonly commandId: string
  /** What an earlier command of this actor did. */
  readonly changeOf: (commandId: string) => Change | undefined
}

/** One thing that can be done: what it needs, how it is called in "Undo …", and what it does to a job. */
export interface CommandDef<Schema extends z.ZodType = z.ZodType> {
  readonly args: Schema
  readonly describe: (doc: JobDocument, args: z.output<Schema>) => string
  readonly plan: (doc: JobDocument, args: z.output<Schema>, context: PlanContext) => Change
}

export const defineCommand = <Schema extends z.ZodType>(def: CommandDef<Schema>): CommandDef<Schema> => def

/** Ids of one to many records: whatever can be done to one can be done to many. */
export const idsSchema = z.array(idSchema).min(1, 'Choose at least one').max(5000, 'At most 5,000 at once')

type Defined<T> = { [F in keyof T]?: Exclude<T[F], undefined> }

/** The same fields given to many records of a kind. */
export function setMany<K extends Kind>(doc: JobDocument, kind: K, ids: readonly string[], set: object): Change {
  const fields = Object.fromEntries(Object.entries(set).filter(([, value]) => value !== undefined)) as Defined<RecordOf<K>>
  return compose(ids.map((id) => updates<K>(need(doc, kind, id), fields as Partial<RecordOf<K>>)))
}

/** "3 plates", or the name of the only one. */
export const some = (ids: readonly string[], nameOne: (id: string) => string, many: string): string =>
  ids.length === 1 ? nameOne(ids[0]!) : `${ids.length} ${many}`
