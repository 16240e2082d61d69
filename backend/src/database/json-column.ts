/** A JSON value from the driver, which parses what the server marks as JSON and leaves other text alone. */
export function fromJson<T>(value: unknown): T {
  return (typeof value === 'string' ? JSON.parse(value) : value) as T;
}
