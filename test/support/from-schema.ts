import fc from 'fast-check';

/** The part of a JSON schema the API's description uses. */
export interface JsonSchema {
  type?: string;
  format?: string;
  pattern?: string;
  enum?: unknown[];
  nullable?: boolean;
  minLength?: number;
  maxLength?: number;
  minimum?: number;
  maximum?: number;
  exclusiveMinimum?: boolean | number;
  minItems?: number;
  maxItems?: number;
  items?: JsonSchema;
  properties?: Record<string, JsonSchema>;
  required?: string[];
  additionalProperties?: boolean | JsonSchema;
  propertyNames?: JsonSchema;
  oneOf?: JsonSchema[];
  anyOf?: JsonSchema[];
  allOf?: JsonSchema[];
}

/** Values that fit a schema, as far as a schema can say. */
export function fitting(schema: JsonSchema): fc.Arbitrary<unknown> {
  const branches = schema.oneOf ?? schema.anyOf;
  if (branches !== undefined) return fc.oneof(...branches.map(fitting));
  if (schema.allOf !== undefined) return fitting(Object.assign({}, ...schema.allOf) as JsonSchema);
  if (schema.enum !== undefined) return fc.constantFrom(...schema.enum);
  const fits = byType(schema);
  return schema.nullable === true ? fc.option(fits) : fits;
}

function byType(schema: JsonSchema): fc.Arbitrary<unknown> {
  switch (schema.type) {
    case 'string':
      return text(schema);
    case 'number':
    case 'integer':
      return number(schema);
    case 'boolean':
      return fc.boolean();
    case 'array':
      return fc.array(fitting(schema.items ?? {}), {
        minLength: schema.minItems ?? 0,
        maxLength: Math.max(schema.minItems ?? 0, Math.min(schema.maxItems ?? 5, 5)),
      });
    case 'object':
      return object(schema);
    default:
      return fc.jsonValue({ maxDepth: 2 });
  }
}

function text({ format, pattern, minLength = 0, maxLength = 40 }: JsonSchema): fc.Arbitrary<string> {
  const instant = fc.date({ min: new Date('1990-01-01'), max: new Date('2060-01-01'), noInvalidDate: true });
  if (format === 'uuid') return fc.uuid();
  if (format === 'email') return fc.emailAddress();
  if (format === 'date-time') return instant.map((date) => date.toISOString());
  if (format === 'date') return instant.map((date) => date.toISOString().slice(0, 10));
  if (pattern?.includes('W(0[1-9]')) return fc.integer({ min: 10, max: 53 }).map((week) => `2026-W${week}`);
  return fc.string({ minLength, maxLength: Math.min(maxLength, 40), unit: 'grapheme' });
}

function number({ type, minimum, maximum, exclusiveMinimum }: JsonSchema): fc.Arbitrary<number> {
  const low = typeof exclusiveMinimum === 'number' ? exclusiveMinimum : (minimum ?? -1e6);
  const high = maximum ?? 1e6;
  if (type === 'integer') return fc.integer({ min: Math.ceil(low), max: Math.floor(Math.min(high, 1e9)) });
  return fc.double({ min: low, max: high, noNaN: true, minExcluded: exclusiveMinimum !== undefined });
}

function object({ properties = {}, required = [], additionalProperties }: JsonSchema): fc.Arbitrary<object> {
  const fields = Object.fromEntries(Object.entries(properties).map(([name, schema]) => [name, fitting(schema)]));
  if (Object.keys(fields).length === 0 && typeof additionalProperties === 'object') {
    return fc.dictionary(fc.string({ maxLength: 8 }), fitting(additionalProperties), { maxKeys: 3 });
  }
  return fc.record(fields, { requiredKeys: required });
}

/** Values nobody asked for: deep, odd, huge, of other types. */
export const odd: fc.Arbitrary<unknown> = fc.oneof(
  fc.jsonValue({ maxDepth: 4 }),
  fc.string({ unit: 'binary', maxLength: 60 }),
  fc.constantFrom<unknown>(
    null,
    true,
    -1,
    1e308,
    '',
    '\u0000',
    '\ud800',
    'x'.repeat(5000),
    [],
    [[[[]]]],
    JSON.parse('{"__proto__":{"polluted":true}}'),
    { constructor: { prototype: {} } },
    "'; drop table club; --",
    '2026-02-30',
    '0000-00-00',
    '999999-01-01',
  ),
);

/** A fitting object with one thing wrong that no schema of the API lets pass. */
export function spoiled(schema: JsonSchema): fc.Arbitrary<unknown> {
  const whole = fitting(schema).filter((value) => typeof value === 'object' && value !== null && !Array.isArray(value));
  const unknownField = fc.tuple(whole, fc.string({ minLength: 1, maxLength: 12 }), odd).map(([value, name, extra]) => ({
    ...(value as object),
    [`no such field ${name}`]: extra,
  }));
  const required = schema.required ?? [];
  if (required.length === 0) return unknownField;
  const lacking = fc.tuple(whole, fc.constantFrom(...required)).map(([value, name]) => {
    const { [name]: _, ...rest } = value as Record<string, unknown>;
    return rest;
  });
  const mistyped = fc
    .tuple(whole, fc.constantFrom(...required), fc.constantFrom<unknown>(null, {}, [{}], true))
    .filter(([, name, wrong]) => !fitsType(schema.properties?.[name], wrong))
    .map(([value, name, wrong]) => ({ ...(value as object), [name]: wrong }));
  return fc.oneof(unknownField, lacking, mistyped);
}

function fitsType(schema: JsonSchema | undefined, value: unknown): boolean {
  if (schema?.type === undefined) return true;
  if (value === null) return schema.nullable === true;
  if (Array.isArray(value)) return schema.type === 'array';
  return schema.type === typeof value;
}
