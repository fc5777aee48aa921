/**
 * JSON with object keys in code-unit order and without white space, so that equal content is equal text and one hash.
 * Properties that are undefined are left out, as JSON does. Throws TypeError for a number that JSON cannot hold.
 */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map((item) => canonicalJson(item ?? null)).join(',')}]`
  if (typeof value === 'object' && value !== null) {
    const record = value as Record<string, unknown>
    const members = Object.keys(record)
      .filter((key) => record[key] !== undefined)
      .sort()
      .map((key) => `${JSON.stringify(key)}:${canonicalJson(record[key])}`)
    return `{${members.join(',')}}`
  }
  if (typeof value === 'number' && !Number.isFinite(value)) throw new TypeError(`${value} has no place in JSON`)
  return JSON.stringify(value ?? null)
}
