/** One result, and what it was made of. */
interface Cell {
  readonly value: unknown
  readonly read: readonly string[]
}

/**
 * Results remembered by what each of them read. A touch forgets just the results that read what was touched, and the
 * results that were made of those; everything else stays as it is.
 */
export class Cells {
  private readonly cells = new Map<string, Cell>()
  private readonly readers = new Map<string, Set<string>>()
  private reading: Set<string> | undefined

  /** Notes that whatever is being worked out has read this. */
  note(key: string): void {
    this.reading?.add(key)
  }

  /** The result of this name, worked out if it is not there. */
  get<T>(name: string, work: () => T): T {
    this.note(name)
    const known = this.cells.get(name)
    if (known) return known.value as T
    const outer = this.reading
    const own = new Set<string>()
    this.reading = own
    try {
      const value = work()
      this.keep(name, value, [...own])
      return value
    } finally {
      this.reading = outer
    }
  }

  /** Forgets what was made of this. Tells the names of the results that are gone. */
  touch(key: string, gone: (name: string) => void): void {
    const names = this.readers.get(key)
    if (!names) return
    this.readers.delete(key)
    for (const name of names) this.forget(name, gone)
  }

  private forget(name: string, gone: (name: string) => void) {
    const cell = this.cells.get(name)
    if (!cell) return
    this.cells.delete(name)
    for (const key of cell.read) this.readers.get(key)?.delete(name)
    gone(name)
    this.touch(name, gone)
  }

  private keep(name: string, value: unknown, read: readonly string[]) {
    this.cells.set(name, { value, read })
    for (const key of read) {
      const names = this.readers.get(key)
      if (names) names.add(name)
      else this.readers.set(key, new Set([name]))
    }
  }
}
