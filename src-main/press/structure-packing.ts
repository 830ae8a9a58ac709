import { deflateSync } from 'node:zlib';

/** Objects that a reader has to unpack to see one of them. */
const IN_ONE_STREAM = 200;
/** Bytes of an entry of the cross-reference stream: kind, place, and index or generation. */
const ENTRY = { kind: 1, place: 4, index: 2 } as const;
const ENTRY_WIDTH = ENTRY.kind + ENTRY.place + ENTRY.index;

interface PdfObject {
  readonly id: number;
  readonly start: number;
  readonly end: number;
}

/** Where an object stands: at an offset of the file, or at a position in a stream of objects. */
type Entry =
  | { readonly kind: 'free' }
  | { readonly kind: 'plain'; readonly offset: number }
  | { readonly kind: 'packed'; readonly stream: number; readonly index: number };

/**
 * The same PDF with its dictionaries in object streams (ISO 32000-1, 7.5.7), which takes an element of the structure
 * tree from about a hundred bytes to a few. Takes what pdfkit writes: one cross-reference table, generation 0
 * everywhere, not encrypted; throws on anything else. Objects that hold streams or plain values stay as they are.
 */
export function packStructure(pdf: Uint8Array): Uint8Array {
  const file = Buffer.from(pdf.buffer, pdf.byteOffset, pdf.byteLength);
  const { objects, size, trailer } = objectsOf(file);
  const entries: Entry[] = Array.from({ length: size }, () => ({ kind: 'free' }));
  const first = objects[0];
  if (first === undefined) throw new Error('a PDF without objects');
  const parts: Buffer[] = [file.subarray(0, first.start)];
  let length = first.start;
  const write = (part: Buffer): void => {
    parts.push(part);
    length += part.length;
  };
  const dictionaries: { readonly id: number; readonly text: Buffer }[] = [];
  for (const { id, start, end } of objects) {
    const text = bodyOf(file, id, start, end);
    if (isDictionary(text)) {
      dictionaries.push({ id, text });
    } else {
      entries[id] = { kind: 'plain', offset: length };
      write(file.subarray(start, end));
    }
  }
  for (let at = 0; at < dictionaries.length; at += IN_ONE_STREAM) {
    const packed = dictionaries.slice(at, at + IN_ONE_STREAM);
    const stream = entries.length;
    packed.forEach(({ id }, index) => {
      entries[id] = { kind: 'packed', stream, index };
    });
    entries.push({ kind: 'plain', offset: length });
    write(objectStream(stream, packed));
  }
  const here = length;
  entries.push({ kind: 'plain', offset: here });
  write(crossReferences(entries, trailer));
  write(Buffer.from(`startxref\n${here}\n%%EOF\n`, 'latin1'));
  return new Uint8Array(Buffer.concat(parts));
}

/** The objects in the order in which they stand, how many numbers are taken, and what the trailer says besides. */
function objectsOf(file: Buffer): {
  readonly objects: readonly PdfObject[];
  readonly size: number;
  readonly trailer: string;
} {
  const tail = file.subarray(file.lastIndexOf('trailer\n')).toString('latin1');
  const match = /^trailer\n<<\n\/Size (\d+)\n([^]*)\n>>\nstartxref\n(\d+)\n%%EOF\n$/.exec(tail);
  const [size, table] = [Number(match?.[1]), Number(match?.[3])];
  const trailer = match?.[2];
  if (trailer === undefined || trailer.includes('/Encrypt')) throw new Error('not a PDF as pdfkit writes it');
  const lines = file
    .subarray(table, file.length - tail.length)
    .toString('latin1')
    .split('\n')
    .slice(2);
  const starts = lines
    .map((line, id) => ({ id, start: Number(line.slice(0, 10)) }))
    .filter((_, index) => index > 0 && index < size)
    .sort((left, right) => left.start - right.start);
  const objects = starts.map(({ id, start }, index) => ({ id, start, end: starts[index + 1]?.start ?? table }));
  return { objects, size, trailer };
}

function bodyOf(file: Buffer, id: number, start: number, end: number): Buffer {
  const [open, close] = [`${id} 0 obj\n`, '\nendobj\n'];
  const [head, foot] = [file.subarray(start, start + open.length), file.subarray(end - close.length, end)];
  if (head.toString('latin1') !== open || foot.toString('latin1') !== close) throw new Error(`no object ${id}`);
  return file.subarray(start + open.length, end - close.length);
}

function isDictionary(text: Buffer): boolean {
  return text.subarray(0, 2).toString('latin1') === '<<' && text.subarray(-2).toString('latin1') === '>>';
}

function objectStream(number: number, objects: readonly { readonly id: number; readonly text: Buffer }[]): Buffer {
  let offset = 0;
  const places = objects.map(({ id, text }) => {
    const place = `${id} ${offset}`;
    offset += text.length + 1;
    return place;
  });
  const head = Buffer.from(`${places.join(' ')}\n`, 'latin1');
  const newLine = Buffer.from('\n');
  const data = Buffer.concat([head, ...objects.flatMap(({ text }) => [text, newLine])]);
  return streamObject(number, `/Type /ObjStm\n/N ${objects.length}\n/First ${head.length}`, data);
}

function crossReferences(entries: readonly Entry[], trailer: string): Buffer {
  const { kind, place, index } = ENTRY;
  const table = Buffer.alloc(entries.length * ENTRY_WIDTH);
  entries.forEach((entry, id) => {
    const at = id * ENTRY_WIDTH;
    const [code, where, nth] = numbersOf(entry);
    table.writeUIntBE(code, at, kind);
    table.writeUIntBE(where, at + kind, place);
    table.writeUIntBE(nth, at + kind + place, index);
  });
  const facts = `/Type /XRef\n/Size ${entries.length}\n/W [${kind} ${place} ${index}]\n${trailer}`;
  return streamObject(entries.length - 1, facts, table);
}

function numbersOf(entry: Entry): readonly [number, number, number] {
  switch (entry.kind) {
    case 'free':
      return [0, 0, 65535];
    case 'plain':
      return [1, entry.offset, 0];
    case 'packed':
      return [2, entry.stream, entry.index];
  }
}

function streamObject(number: number, facts: string, data: Buffer): Buffer {
  const deflated = deflateSync(data);
  const head = `${number} 0 obj\n<<\n${facts}\n/Length ${deflated.length}\n/Filter /FlateDecode\n>>\nstream\n`;
  return Buffer.concat([Buffer.from(head, 'latin1'), deflated, Buffer.from('\nendstream\nendobj\n', 'latin1')]);
}
