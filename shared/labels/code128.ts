import JsBarcode from 'jsbarcode'

const seen = new Map<string, string>()

/**
 * The modules of a Code 128 symbol (ISO/IEC 15417) as a string of 1 for bar and 0 for space, without quiet zones.
 * Throws when the text has a character that Code 128 cannot carry; label texts are printable ASCII, so they never do.
 */
export function code128Modules(text: string): string {
  let modules = seen.get(text)
  if (modules === undefined) {
    const symbol: { encodings?: { data: string }[] } = {}
    JsBarcode(symbol, text, { format: 'CODE128' })
    modules = (symbol.encodings ?? []).map((encoding) => encoding.data).join('')
    if (seen.size > 20_000) seen.clear()
    seen.set(text, modules)
  }
  return modules
}
