/** A value that can stand in a path or a query. */
export type Scalar = string | number | boolean;
/** Query values by name; arrays repeat the name, `undefined` and empty arrays leave it out. */
export type QueryValues = Readonly<Record<string, unknown>>;

/** Fills the `:names` of a contract's path, percent-encoded, and appends the query. */
export function requestUrl(
  path: string,
  params: Readonly<Record<string, unknown>> = {},
  query: QueryValues = {},
): string {
  const filled = path.replace(/:(\w+)/g, (_, name: string) => {
    const value = params[name];
    if (!isScalar(value)) throw new Error(`${path} needs a value for ${name}`);
    return encodeURIComponent(String(value));
  });
  const search = queryText(query);
  return search ? `${filled}?${search}` : filled;
}

function queryText(query: QueryValues): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    for (const one of Array.isArray(value) ? (value as unknown[]) : [value]) {
      if (isScalar(one)) search.append(name, String(one));
    }
  }
  return search.toString();
}

function isScalar(value: unknown): value is Scalar {
  return typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean';
}
