/** What is read of a JSON Schema here. */
export type Schema = {
  type?: string | string[];
  const?: unknown;
  enum?: unknown[];
  properties?: Record<string, Schema>;
  anyOf?: Schema[];
  oneOf?: Schema[];
  allOf?: Schema[];
};

/** A body in which every field that a schema knows has a value of a type that it does not take. */
export function misfit(schema: Schema): Record<string, unknown> {
  const properties = Object.assign({}, ...parts(schema).map((part) => part.properties ?? {})) as Record<string, Schema>;
  return Object.fromEntries(Object.entries(properties).map(([name, property]) => [name, wrongValue(property)]));
}

const values: Record<string, unknown> = {
  object: { odd: true },
  string: 'odd',
  boolean: true,
  array: ['odd'],
  number: 0.5,
};

function wrongValue(schema: Schema): unknown {
  const taken = new Set(parts(schema).flatMap(typesOf));
  const name = Object.keys(values).find((type) => !taken.has(type));
  if (!name) throw new Error(`Everything fits here: ${JSON.stringify(schema)}`);
  return values[name];
}

/** A schema and all that it is put together from. */
function parts(schema: Schema): Schema[] {
  return [schema, ...[schema.anyOf, schema.oneOf, schema.allOf].flatMap((list) => (list ?? []).flatMap(parts))];
}

function typesOf({ type, const: one, enum: some }: Schema): string[] {
  const examples = [...(one === undefined ? [] : [one]), ...(some ?? [])];
  return [type ?? [], examples.map((value) => (Array.isArray(value) ? 'array' : typeof value))].flat();
}
