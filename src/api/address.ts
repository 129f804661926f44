/**
 * Fills an endpoint's path.
 * @param path with `:name` for each parameter
 * @throws RangeError where a parameter is missing
 * @example pathOf('/api/studies/:studyId', { studyId: 'a/b' }) // '/api/studies/a%2Fb'
 */
export function pathOf(path: string, params: Readonly<Record<string, string>> = {}): string {
  return path.replace(/:(\w+)/g, (_, name: string) => {
    const value = params[name];
    if (value === undefined) throw new RangeError(`no ${name} for ${path}`);
    return encodeURIComponent(value);
  });
}

/**
 * @returns the query string with its question mark, without what is undefined; empty for nothing
 * @example queryOf({ after: undefined, limit: 20 }) // '?limit=20'
 */
export function queryOf(query: Readonly<Record<string, string | number | undefined>> = {}): string {
  const pairs = Object.entries(query).flatMap(([name, value]) =>
    value === undefined ? [] : [[name, String(value)]],
  );
  return pairs.length === 0 ? '' : `?${new URLSearchParams(pairs)}`;
}
