import { seededRandom, type RandomSource } from '../precision/seeded-random.ts';

/** No vowels and no Y, and nothing that looks like a digit or another letter: no B, G, I, L, O, Q, S, U, V, Z. */
const LETTERS = 'CDFHJKMNPRTWX';
/** Without 0, 1, and without 3 and 4, which stand for vowels in words written with digits. */
const DIGITS = '256789';

/** Letters and digits in turn, so that no two letters stand together and no code is a word. */
const SHORT_CODE = [LETTERS, DIGITS, LETTERS];
const LONG_CODE = [LETTERS, DIGITS, LETTERS, DIGITS];

export const MOST_PUPILS_WITH_CODES = 2000;
/** At most about a third of the short codes are given, so that one misread is seldom another pupil’s. */
const MOST_WITH_SHORT_CODES = 338;

/**
 * One code for each of 0 to 2,000 pupils, in the order of the list: 3 signs for up to 338 pupils, 4 for more, no two
 * alike. They are drawn at random from all such codes (Fisher and Yates), so a code tells nothing of a pupil's name,
 * score or place in the list. The same seed gives the same codes, and pupils added at the end leave those before them
 * as they are while the length is the same.
 *
 * Whoever has the seed and the order of the list can draw the codes again: the seed belongs to the key. It must not be
 * printed or told with the codes, and should be drawn, not chosen, since a small number can be guessed. Pages with the
 * same codes can be laid side by side: another report should have another seed unless that is wanted.
 */
export function pupilCodes(pupils: number, seed: number): readonly string[] {
  if (!Number.isSafeInteger(pupils) || pupils < 0 || pupils > MOST_PUPILS_WITH_CODES) {
    throw new RangeError(`codes are given to 0 to ${MOST_PUPILS_WITH_CODES} pupils`);
  }
  const codes = allCodes(pupils <= MOST_WITH_SHORT_CODES ? SHORT_CODE : LONG_CODE);
  return drawn(codes, pupils, seededRandom(seed));
}

/** The numbers of the pupils in the order of their codes, in which pages with codes are printed. */
export function orderByCode(codes: readonly string[]): readonly number[] {
  return codes
    .map((code, pupil) => ({ code, pupil }))
    .sort((one, other) => (one.code < other.code ? -1 : 1))
    .map(({ pupil }) => pupil);
}

function allCodes(signs: readonly string[]): readonly string[] {
  return signs.reduce<readonly string[]>(
    (starts, choice) => starts.flatMap((start) => [...choice].map((sign) => start + sign)),
    [''],
  );
}

/** So many of the items in random order, each order as likely. */
function drawn(items: readonly string[], count: number, next: RandomSource): readonly string[] {
  const pool = [...items];
  for (let place = 0; place < count; place += 1) {
    const other = place + below(pool.length - place, next);
    [pool[place], pool[other]] = [pool[other] ?? '', pool[place] ?? ''];
  }
  return pool.slice(0, count);
}

const WORDS = 2 ** 32;

/** A whole number from 0 to `limit` − 1, each exactly as likely. */
function below(limit: number, next: RandomSource): number {
  const most = WORDS - (WORDS % limit);
  let word = next();
  while (word >= most) word = next();
  return word % limit;
}
