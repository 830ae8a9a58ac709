import { readFile, stat } from 'node:fs/promises';
import { basename } from 'node:path';
import type { Reply } from '../../shared-core/desk.ts';
import { readForeignRanks, type ForeignColumn } from '../../shared-core/norms/why-differ-column.ts';
import type { ScoreScale } from '../../shared-core/scale/score-scale.ts';
import { guessEncoding, textStart } from '../cohort-file/text-encoding.ts';
import { diskTrouble } from '../project-file/disk-trouble.ts';

/** Far more than a line for each attainable score takes. */
const MOST_BYTES = 4_000_000;

/** Somebody's ranks from a text file, one "score rank" a line, on the scale of the group they are compared with. */
export async function readRankFile(path: string, scale: ScoreScale): Promise<Reply<ForeignColumn>> {
  const file = basename(path);
  let bytes: Uint8Array;
  try {
    const { size } = await stat(path);
    if (size > MOST_BYTES) return { ok: false, problem: `${file} is too large for a column of ranks.` };
    bytes = await readFile(path);
  } catch (error) {
    return { ok: false, problem: diskTrouble(file, 'read', error) };
  }
  const text = textStart(guessEncoding(bytes, true), bytes);
  if (text.includes('\0')) {
    return { ok: false, problem: `${file} is not a text file. Save the two columns, score and rank, as text or csv.` };
  }
  const { column, problems } = readForeignRanks(text, scale);
  if (column !== null) return { ok: true, value: column };
  const [first, ...others] = problems;
  if (first === undefined || first.line === 0) {
    const whatToDo = 'Write one line for each score: the score, a space, and its percentile rank.';
    return { ok: false, problem: `${file} holds no ranks. ${whatToDo}` };
  }
  return { ok: false, problem: `${file}, line ${first.line}: ${first.problem}${moreLines(others.length)}` };
}

function moreLines(count: number): string {
  if (count === 0) return '';
  return count === 1 ? ' One more line cannot be read.' : ` ${count} more lines cannot be read.`;
}
