import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { Readable } from 'node:stream';
import Papa from 'papaparse';
import type { Reading } from '../../shared-core/norms/reading.ts';
import { unreadable, type KnownFile } from './file-kind.ts';
import { NOTHING_IN_FILE, RowNumbering } from './row-numbering.ts';
import { CANCELLED, throwMistake, type PassEnd, type ReadHooks, type RowTaker } from './row-taker.ts';
import { ENCODING_WORDS, textBlocks } from './text-encoding.ts';

const BLOCK_BYTES = 128 * 1024;
/** A row longer than this is taken for a quotation mark that was never closed. */
const LONGEST_ROW = 1_000_000;

/** Reads a delimited text block by block; memory does not grow with the file. */
export async function readDelimited(
  known: KnownFile,
  reading: Reading,
  taker: RowTaker,
  hooks: ReadHooks,
): Promise<PassEnd> {
  const hash = createHash('sha256');
  const blocks = createReadStream(known.path, { highWaterMark: BLOCK_BYTES });
  const texts = lineEndsMadeEven(decoded(blocks, known, reading, hooks, (block) => hash.update(block)));
  try {
    const end = await splitRows(texts, reading, taker, hooks.signal);
    if (hooks.signal.aborted) return { ok: false, problem: CANCELLED };
    if (end.problem !== null) return { ok: false, problem: end.problem };
    return { ok: true, value: { sha256: end.complete ? hash.digest('hex') : null } };
  } catch (error) {
    throwMistake(error);
    return { ok: false, problem: error instanceof WrongBytes ? error.message : unreadable(error, known.file) };
  } finally {
    blocks.destroy();
  }
}

/** Bytes that the chosen encoding does not have. */
class WrongBytes extends Error {}

async function* decoded(
  blocks: AsyncIterable<Buffer>,
  known: KnownFile,
  { encoding }: Reading,
  { onProgress }: ReadHooks,
  see: (block: Buffer) => void,
): AsyncGenerator<string> {
  const decoder = textBlocks(encoding);
  let read = 0;
  try {
    for await (const block of blocks) {
      see(block);
      read += block.length;
      yield decoder.decode(block);
      onProgress(Math.min(1, read / known.bytes));
    }
    yield decoder.end();
  } catch (error) {
    if (!(error instanceof TypeError)) throw error;
    throw new WrongBytes(
      `${known.file} has bytes that are not ${ENCODING_WORDS[encoding]}. Choose another encoding, for example ` +
        `${ENCODING_WORDS[encoding === 'utf-8' ? 'windows-1252' : 'utf-8']}.`,
    );
  }
}

/** CRLF and a lone CR become LF, also where they are cut by the end of a block. */
async function* lineEndsMadeEven(texts: AsyncIterable<string>): AsyncGenerator<string> {
  let held = '';
  for await (const text of texts) {
    let whole = held + text;
    held = whole.endsWith('\r') ? '\r' : '';
    if (held !== '') whole = whole.slice(0, -1);
    if (whole !== '') yield whole.includes('\r') ? whole.replace(/\r\n?/g, '\n') : whole;
  }
  if (held !== '') yield '\n';
}

interface SplitEnd {
  readonly complete: boolean;
  readonly problem: string | null;
}

function splitRows(
  texts: AsyncIterable<string>,
  reading: Reading,
  taker: RowTaker,
  signal: AbortSignal,
): Promise<SplitEnd> {
  const numbering = new RowNumbering(reading, taker);
  let problem: string | null = null;
  let complete = true;
  let fed = 0;
  async function* counted(): AsyncGenerator<string> {
    for await (const text of texts) {
      fed += text.length;
      yield text;
    }
  }
  return new Promise((resolve, reject) => {
    const input = Readable.from(counted());
    const stop = (parser: Papa.Parser): void => {
      complete = false;
      parser.abort();
      input.destroy();
    };
    Papa.parse<string[], Readable>(input, {
      delimiter: reading.separator,
      newline: '\n',
      chunk: ({ data, errors, meta }, parser) => {
        const fault = errors.find(({ type, row }) => type === 'Quotes' && (row ?? 0) < data.length);
        const open = fed - meta.cursor > LONGEST_ROW;
        if (fault !== undefined || open) {
          problem = brokenQuote(numbering.records + 1 + (fault?.row ?? data.length));
          stop(parser);
        } else if (signal.aborted || !numbering.take(data)) {
          stop(parser);
        }
      },
      complete: () => {
        if (problem === null && complete && !numbering.foundColumns) problem = NOTHING_IN_FILE;
        resolve({ complete, problem });
      },
      error: reject,
    });
  });
}

function brokenQuote(row: number): string {
  return (
    `Row ${row} has a quotation mark (") that does not open and close its cell, so that the rows after it cannot be told ` +
    'apart. Correct that row, or double the mark where it belongs to the text.'
  );
}
