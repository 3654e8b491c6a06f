import type { Statement } from './captureStatements.ts'

/** What differs from one command to the next. */
export const varying = ['jobId', 'commandId', 'runId', 'purpose', 'version', 'next', 'args', 'change', 'at'] as const
export type Varying = (typeof varying)[number]

/** A value of a statement: always this one, or what varies. */
type Value = { readonly is: unknown } | { readonly of: Varying }

export interface PlannedStatement {
  readonly sql: string
  readonly values: readonly Value[]
}

/** Everything the bare server is told: it reads it from a file when it starts. */
export interface BarePlan {
  readonly databaseUrl: string
  readonly open: readonly PlannedStatement[]
  readonly command: readonly PlannedStatement[]
  /** The answer to opening each job, as it was when the server started. */
  readonly jobs: readonly { readonly id: string; readonly records: readonly { readonly kind: string; readonly id: string; readonly purpose?: string }[] }[]
  readonly actorId: string
}

/** Statements in which what varied is left open. Throws where two things that vary had one value, or one stood nowhere. */
export function planOf(statements: readonly Statement[], known: Partial<Record<Varying, unknown>>): PlannedStatement[] {
  const names = new Map<unknown, Varying>()
  for (const name of varying) {
    if (!(name in known)) continue
    if (names.has(known[name])) throw new Error(`${name} and ${names.get(known[name])} have one value`)
    names.set(known[name], name)
  }
  const planned = statements.map(({ sql, values }) => ({
    sql,
    values: values.map((value): Value => {
      const name = names.get(value)
      return name ? { of: name } : { is: value }
    }),
  }))
  const found = new Set(planned.flatMap(({ values }) => values.map((value) => ('of' in value ? value.of : undefined))))
  for (const name of names.values()) if (!found.has(name)) throw new Error(`${name} stands in no statement`)
  return planned
}
