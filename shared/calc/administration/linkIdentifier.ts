export interface LinkIdentifier {
  /** Floor number and letter of the telecom space, such as 1A. */
  floor: number
  space: string
  /** Panel letters and port, such as A and 47. */
  panel: string
  port: number
}

const form = /^(\d{1,2})([A-Z]{1,2})-([A-Z]{1,2})(\d{2,4})$/

/**
 * Reads a horizontal link identifier of the form fs-an, such as 1A-A47: floor and space, panel and port. Null: any
 * other form. Source: TIA-606; a university label standard shows 1A, panel A, port 15; digit counts from memory.
 */
export function readLinkIdentifier(text: string): LinkIdentifier | null {
  const read = form.exec(text)
  if (read === null) return null
  const [, floor = '', space = '', panel = '', port = ''] = read
  return { floor: Number(floor), space, panel, port: Number(port) }
}

/** Whether a text is a link identifier of that form. */
export const isLinkIdentifier = (text: string): boolean => form.test(text)
