/** Ends the process with a sentence, and with everything for whoever wants it. */
export function failStart(error: unknown): never {
  console.error(error instanceof Error ? error.message : error)
  if (error instanceof Error && error.cause) console.error(process.env['LOG_LEVEL'] === 'debug' ? error : `(${String((error.cause as { message?: string }).message ?? error.cause)})`)
  process.exit(1)
}
