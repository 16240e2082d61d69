import 'fake-indexeddb/auto';
import { deserialize, serialize } from 'node:v8';

// The test's browser has no structuredClone, which the fake store copies values with.
globalThis.structuredClone ??= <T>(value: T): T => deserialize(serialize(value)) as T;

/** Throws away everything that was stored, so that each test starts on a new phone. */
export function newPhone(): void {
  indexedDB = new IDBFactory();
}
