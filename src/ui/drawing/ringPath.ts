const round = (value: number) => Math.round(value * 100) / 100

/** A rounded square from its top centre, clockwise: the ring that stands for a stage, progress and what is current. */
export function ringPath(size: number, inset: number, radius: number): string {
  const [a, b, m, r] = [round(inset), round(size - inset), round(size / 2), round(radius)]
  return `M${m} ${a}H${round(b - r)}A${r} ${r} 0 0 1 ${b} ${round(a + r)}V${round(b - r)}A${r} ${r} 0 0 1 ${round(b - r)} ${b}H${round(a + r)}A${r} ${r} 0 0 1 ${a} ${round(b - r)}V${round(a + r)}A${r} ${r} 0 0 1 ${round(a + r)} ${a}Z`
}

/** The first quarters of the ring, clockwise from the top right, with gaps so that they read without colour. */
export function quarterPath(size: number, stroke: number, quarters: number): string {
  const i = stroke / 2
  const r = (size - stroke) * 0.34
  const g = Math.max(0.5, stroke * 0.24)
  const [a, b, m] = [i, size - i, size / 2]
  const parts = [
    `M${round(m + g)} ${round(a)}H${round(b - r)}A${round(r)} ${round(r)} 0 0 1 ${round(b)} ${round(a + r)}V${round(m - g)}`,
    `M${round(b)} ${round(m + g)}V${round(b - r)}A${round(r)} ${round(r)} 0 0 1 ${round(b - r)} ${round(b)}H${round(m + g)}`,
    `M${round(m - g)} ${round(b)}H${round(a + r)}A${round(r)} ${round(r)} 0 0 1 ${round(a)} ${round(b - r)}V${round(m + g)}`,
  ]
  return parts.slice(0, quarters).join('')
}
