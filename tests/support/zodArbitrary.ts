import fc, { type Arbitrary } from 'fast-check'
import { z } from 'zod'
import { labelPatternSchema } from '../../shared/labels/pattern.ts'

/** Values that a schema takes, made from the schema itself: a new field is tried without anybody thinking of it. */
export function arbitraryOf<Schema extends z.ZodType>(schema: Schema): Arbitrary<z.output<Schema>> {
  return build(schema).filter((value) => schema.safeParse(value).success).map((value) => schema.parse(value))
}

interface Bounds {
  readonly minimum?: number
  readonly maximum?: number
  readonly whole?: boolean
  readonly pattern?: RegExp
}

/** What the checks of a schema say about size and form. */
function boundsOf(schema: z.ZodType): Bounds {
  const { checks = [], format } = (schema as unknown as { _zod: { def: { checks?: { _zod: { def: Record<string, unknown> } }[]; format?: string } } })._zod.def
  return checks.map((each) => each._zod.def).reduce<Bounds>((bounds, { check, value, minimum, maximum, pattern }) => {
    if (check === 'greater_than' || check === 'min_length') return { ...bounds, minimum: Number(value ?? minimum) }
    if (check === 'less_than' || check === 'max_length') return { ...bounds, maximum: Number(value ?? maximum) }
    return check === 'string_format' && pattern instanceof RegExp ? { ...bounds, pattern } : bounds
  }, { whole: format === 'safeint' })
}

/** Where chance alone would never hit what a schema takes. */
const chosen = new Map<z.ZodType, Arbitrary<unknown>>([[labelPatternSchema, fc.constantFrom('{room}{plate}-{kind}{n}', 'W{serial4}', '{level}.{room}-{n2}')]])

function build(schema: z.ZodType): Arbitrary<unknown> {
  const known = chosen.get(schema)
  if (known) return known
  if (schema instanceof z.ZodISODateTime) return fc.date({ min: new Date('0000-01-01T00:00:00Z'), max: new Date('9999-12-31T23:59:59.999Z'), noInvalidDate: true }).map((date) => date.toISOString())
  if (schema instanceof z.ZodString) return text(boundsOf(schema))
  if (schema instanceof z.ZodNumber) return number(boundsOf(schema))
  if (schema instanceof z.ZodBoolean) return fc.boolean()
  if (schema instanceof z.ZodLiteral) return fc.constantFrom(...(schema.values as Set<unknown>))
  if (schema instanceof z.ZodEnum) return fc.constantFrom(...schema.options)
  if (schema instanceof z.ZodNullable) return fc.option(build(schema.unwrap() as z.ZodType), { nil: null })
  if (schema instanceof z.ZodOptional || schema instanceof z.ZodDefault) return build(schema.unwrap() as z.ZodType)
  if (schema instanceof z.ZodArray) {
    const { minimum = 0, maximum = 5 } = boundsOf(schema)
    return fc.array(build(schema.element as z.ZodType), { minLength: minimum, maxLength: Math.max(minimum, Math.min(maximum, minimum + 4)) })
  }
  if (schema instanceof z.ZodUnion) return fc.oneof(...(schema.options as z.ZodType[]).map(build))
  if (schema instanceof z.ZodRecord) return fc.dictionary(build(schema.keyType as z.ZodType) as Arbitrary<string>, build(schema.valueType as z.ZodType), { maxKeys: 4 })
  if (schema instanceof z.ZodObject) {
    const shape = schema.shape as Record<string, z.ZodType>
    const required = Object.keys(shape).filter((key) => !(shape[key] instanceof z.ZodOptional))
    return fc.record(Object.fromEntries(Object.entries(shape).map(([key, each]) => [key, build(each)])), { requiredKeys: required })
  }
  throw new Error(`No values are made for ${schema.constructor.name} yet`)
}

/** Text at its limits as well as within: every script, quotes, backslashes, line ends, characters of four bytes. */
function text({ minimum = 0, maximum = 200, pattern }: Bounds): Arbitrary<unknown> {
  if (pattern && !pattern.source.includes('\\p') && !pattern.source.includes('\\P')) return fc.stringMatching(pattern)
  const awkward = fc.constantFrom('é', 'Ω', '½', '日', '🔌', "'", '"', '\\', '%', '_', '`', ';', '\u0000', '\n', '\u200f', ' ', 'a', 'A', '0')
  const free = fc.oneof(fc.string({ unit: 'grapheme', minLength: minimum, maxLength: maximum }), fc.array(awkward, { minLength: minimum, maxLength: Math.min(maximum, 60) }).map((parts) => parts.join('')), fc.constant('x'.repeat(maximum)))
  return free.map((value) => value.trim()).filter((value) => value.length >= minimum && value.length <= maximum)
}

function number({ minimum = -1e6, maximum = 1e6, whole }: Bounds): Arbitrary<number> {
  if (whole) return fc.integer({ min: Math.ceil(minimum), max: Math.floor(maximum) })
  return fc.oneof(fc.double({ min: minimum, max: maximum, noNaN: true }), fc.integer({ min: Math.ceil(minimum), max: Math.floor(maximum) })).map((value) => value + 0)
}
