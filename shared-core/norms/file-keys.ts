/**
 * Keys in files are lower-case-with-hyphens, in the code they are camelCase. These two turn the one into the other at
 * every depth. Values are left alone, so text that the user typed must never serve as a key.
 */
export function toFileKeys(value: unknown): unknown {
  return renameKeys(value, fileKey);
}

/** One key, or a path of keys with dots between them, as files write it. */
export function fileKey(key: string): string {
  return key.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`);
}

export function fromFileKeys(value: unknown): unknown {
  return renameKeys(value, (key) => key.replace(/-([a-z0-9])/g, (_, letter: string) => letter.toUpperCase()));
}

function renameKeys(value: unknown, rename: (key: string) => string): unknown {
  if (Array.isArray(value)) return value.map((item) => renameKeys(item, rename));
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([key, item]) => [rename(key), renameKeys(item, rename)]));
}
