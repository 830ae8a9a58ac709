import { ownCopy } from './cohort-counter-texts.ts';

/**
 * Decides on rows whose identifier occurred before. It is asked for every row that has an identifier and is neither
 * blank nor ragged, in file order; identifiers are trimmed texts, so that "007" and "7" are two people.
 */
export interface Identities {
  /** True when the row is left out as a duplicate. */
  leavesOut(id: string): boolean;
}

/**
 * A set of fixed size that never forgets a text but now and then claims one it has not met (Bloom 1970, Communications
 * of the ACM 13(7)); four bits a text, taken from two hashes (Kirsch & Mitzenmacher 2006). With 2^28 bits and
 * 10,000,000 texts about one claim in 3,000 is false; what is claimed is counted exactly in another pass.
 */
export class SeenFilter {
  private readonly words: Uint32Array;
  private readonly mask: number;

  /** Size as a power of two, 5 to 31 (32 bits to 256 MB). */
  constructor(bitsExponent: number) {
    if (!Number.isInteger(bitsExponent) || bitsExponent < 5 || bitsExponent > 31) {
      throw new RangeError('the filter holds 2^5 to 2^31 bits');
    }
    const bits = 2 ** bitsExponent;
    this.words = new Uint32Array(bits / 32);
    this.mask = bits - 1;
  }

  /** Adds the text; false means that it was surely not there before. */
  meet(text: string): boolean {
    let first = 0x811c9dc5;
    let second = 0x9e3779b9;
    for (let index = 0; index < text.length; index += 1) {
      const code = text.charCodeAt(index);
      first = Math.imul(first ^ code, 0x01000193);
      second = Math.imul(second + code, 0x85ebca6b);
      second ^= second >>> 13;
    }
    first = spread(first);
    second = spread(second) | 1;
    let met = true;
    for (let probe = 0; probe < 4; probe += 1) {
      const bit = ((first + Math.imul(probe, second)) & this.mask) >>> 0;
      const word = this.words[bit >>> 5] ?? 0;
      const flag = 1 << (bit & 31);
      if ((word & flag) === 0) {
        met = false;
        this.words[bit >>> 5] = word | flag;
      }
    }
    return met;
  }
}

function spread(hash: number): number {
  let mixed = hash;
  mixed = Math.imul(mixed ^ (mixed >>> 16), 0x85ebca6b);
  mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2ae35);
  return mixed ^ (mixed >>> 16);
}

/** First pass: leaves nothing out and collects the identifiers that may have occurred before. */
export class SuspectIdentities implements Identities {
  /** Holds every identifier that occurs twice, and a few that do not. */
  readonly suspects = new Set<string>();

  constructor(private readonly filter: SeenFilter) {}

  leavesOut(id: string): boolean {
    if (this.filter.meet(id)) this.suspects.add(ownCopy(id));
    return false;
  }
}

/** Keeps the first row of each identifier. Only suspects are looked at where they are known. */
export class FirstIdentities implements Identities {
  private readonly met = new Set<string>();

  constructor(private readonly suspects: ReadonlySet<string> | null = null) {}

  leavesOut(id: string): boolean {
    if (this.suspects !== null && !this.suspects.has(id)) return false;
    if (this.met.has(id)) return true;
    this.met.add(ownCopy(id));
    return false;
  }
}

/** Leaves nothing out and finds which suspects occur more than once. */
export class RepeatedIdentities implements Identities {
  readonly repeated = new Set<string>();
  private readonly met = new Set<string>();

  constructor(private readonly suspects: ReadonlySet<string>) {}

  leavesOut(id: string): boolean {
    if (this.suspects.has(id)) {
      const own = ownCopy(id);
      if (this.met.has(own)) this.repeated.add(own);
      else this.met.add(own);
    }
    return false;
  }
}

/** Leaves out every row of the identifiers given. */
export class UniqueIdentities implements Identities {
  constructor(private readonly repeated: ReadonlySet<string>) {}

  leavesOut(id: string): boolean {
    return this.repeated.has(id);
  }
}
