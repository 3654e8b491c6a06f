/** Something that results are made of: a record, an answer of the index, or another result. */
export class Source {
  private readers: Cell[] = []
  /** The last reader, so that reading twice notes once. */
  private last: Cell | undefined
  private lost = 0

  /** Notes that this cell was made of this. */
  readBy(cell: Cell): void {
    if (this.last === cell) return
    this.last = cell
    this.readers.push(cell)
    cell.madeOf.push(this)
  }

  /** Gives away its readers, and has none. */
  takeReaders(): readonly Cell[] {
    const readers = this.readers
    this.readers = []
    this.last = undefined
    this.lost = 0
    return readers
  }

  /** One of its readers is forgotten; when half of them are, they are swept out. */
  loseReader(): void {
    if (++this.lost * 2 <= this.readers.length) return
    this.readers = this.readers.filter((cell) => cell.isKept)
    this.lost = 0
  }
}

/** One result, and what it was made of. */
export class Cell extends Source {
  value: unknown = undefined
  isKept = true
  readonly madeOf: Source[] = []
  constructor(
    readonly group: string,
    readonly id: string,
  ) {
    super()
  }
}

/**
 * Results remembered by what each of them read. A touch forgets just the results that read what was touched, and the
 * results that were made of those; everything else stays as it is.
 */
export class Cells {
  private readonly groups = new Map<string, Map<string, Cell>>()
  private current: Cell | undefined

  /** Notes that whatever is being worked out has read this. */
  note(source: Source): void {
    if (this.current) source.readBy(this.current)
  }

  /** The result of this name, worked out if it is not there. */
  get<T>(group: string, id: string, work: () => T): T {
    let cells = this.groups.get(group)
    if (!cells) this.groups.set(group, (cells = new Map()))
    const known = cells.get(id)
    if (known) {
      this.note(known)
      return known.value as T
    }
    const cell = new Cell(group, id)
    this.note(cell)
    const outer = this.current
    this.current = cell
    try {
      const value = work()
      cell.value = value
      cells.set(id, cell)
      return value
    } finally {
      this.current = outer
    }
  }

  /** Forgets what was made of this, and tells which results are gone. */
  touch(source: Source, gone: (cell: Cell) => void): void {
    for (const cell of source.takeReaders()) {
      if (!cell.isKept) continue
      cell.isKept = false
      this.groups.get(cell.group)?.delete(cell.id)
      for (const other of cell.madeOf) if (other !== source) other.loseReader()
      gone(cell)
      this.touch(cell, gone)
    }
  }
}
