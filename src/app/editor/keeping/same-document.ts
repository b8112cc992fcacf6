/**
 * Whether two pieces of JSON say the same, whatever the order of their keys. A key that holds undefined counts as
 * absent, since no file and no server ever sees it.
 */
export function isSameDocument(a: unknown, b: unknown): boolean {
  if (a === b) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false;
  if (Array.isArray(a) || Array.isArray(b)) {
    return (
      Array.isArray(a) &&
      Array.isArray(b) &&
      a.length === b.length &&
      a.every((item, i) => isSameDocument(item, b[i]))
    );
  }
  const left = a as Readonly<Record<string, unknown>>;
  const right = b as Readonly<Record<string, unknown>>;
  return [...new Set([...Object.keys(left), ...Object.keys(right)])].every((key) =>
    isSameDocument(left[key], right[key]),
  );
}
