/** A JSON object as it stands in a file, with the keys of the file. */
export type FileObject = Readonly<Record<string, unknown>>;

/** What a text holds as JSON, a byte-order mark left out; undefined where it is not whole JSON. */
export function jsonIn(text: string): unknown {
  try {
    return JSON.parse(text.replace(/^\uFEFF/, ''));
  } catch {
    return undefined;
  }
}

export function isFileObject(value: unknown): value is FileObject {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
