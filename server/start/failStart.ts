/** Ends the process with a sentence; with everything for whoever asks for it. */
export function failStart(error: unknown): never {
  console.error(error instanceof Error ? error.message : error)
  if (error instanceof Error && error.cause !== undefined) {
    const cause = error.cause instanceof Error ? error.cause.message : String(error.cause)
    console.error(process.env['LOG_LEVEL'] === 'debug' ? error : `(${cause.split('\n')[0]})`)
  }
  process.exit(1)
}
