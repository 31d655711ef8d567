import { z } from 'zod';

/** Text that PostgreSQL can hold: no NUL, no lone surrogates. */
function storable(text: string): boolean {
  return !text.includes('\u0000') && text.isWellFormed();
}

/** A line or paragraph typed by a person, trimmed; empty is refused. */
export function text(name: string, max: number) {
  return z
    .string({ error: `${name} must be text` })
    .max(max, `${name} must have at most ${max} characters`)
    .refine(storable, `${name} holds characters that cannot be stored`)
    .trim()
    .min(1, `${name} must not be empty`);
}

/** Like `text`, but empty becomes null. */
export function optionalText(name: string, max: number) {
  return z
    .string({ error: `${name} must be text` })
    .max(max, `${name} must have at most ${max} characters`)
    .refine(storable, `${name} holds characters that cannot be stored`)
    .trim()
    .transform((value) => (value === '' ? null : value))
    .nullable()
    .default(null);
}

/** A finite number in lower..upper; the message says the range with its unit. */
export function measure(name: string, lower: number, upper: number, unit = '') {
  const range = `${name} must lie between ${lower} and ${upper}${unit ? ` ${unit}` : ''}`;
  return z.number({ error: `${name} must be a number` }).min(lower, range).max(upper, range);
}

export function optionalMeasure(name: string, lower: number, upper: number, unit = '') {
  return measure(name, lower, upper, unit).nullable().default(null);
}

/** A calendar day in the workshop's zone, `YYYY-MM-DD`. */
export function day(name: string) {
  return z.iso
    .date({ error: `${name} must be a day such as 2026-03-14` })
    // What is no day at all was told already.
    .refine((value) => !/^\d{4}-/.test(value) || (value >= '1990-01-01' && value <= '2100-12-31'), `${name} must lie between 1990 and 2100`);
}

export function optionalDay(name: string) {
  return day(name).nullable().default(null);
}

/** An instant, ISO 8601 with `Z`. */
export const instant = z.iso.datetime({ error: 'Must be an instant such as 2026-03-14T09:30:00Z' });

/** A record's id, made by the client. */
export const id = z.uuidv7({ error: 'Must be a UUID of version 7' });

/** A count of things in lower..upper. */
export function count(name: string, lower: number, upper: number) {
  const range = `${name} must be a whole number from ${lower} to ${upper}`;
  return z.int({ error: range }).min(lower, range).max(upper, range);
}

/** Fields that every record read back carries. */
export const recordFields = { id: z.string(), version: z.int(), createdAt: z.string(), updatedAt: z.string() };

type Changeable<Shape extends Record<string, z.ZodType>> = {
  [Key in keyof Shape]: z.ZodOptional<Shape[Key] extends z.ZodDefault<infer Inner extends z.ZodType> ? Inner : Shape[Key]>;
};

/**
 * Body of a PATCH: every field may be left out, and one left out stays as it is.
 * Defaults are taken off first; they would wipe what the sender did not mention.
 */
export function changeOf<Shape extends Record<string, z.ZodType>>(shape: Shape) {
  const optional = Object.fromEntries(
    Object.entries(shape).map(([key, schema]) => [key, (schema instanceof z.ZodDefault ? (schema.unwrap() as z.ZodType) : schema).optional()]),
  ) as Changeable<Shape>;
  return z.strictObject(optional);
}
