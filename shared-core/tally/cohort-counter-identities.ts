import { ownCopy } from './cohort-counter-texts.ts';

/**
 * Decides on rows whose identifier occurred before. It is asked for every row that has an identifier and is neither
 * blank nor ragged, in file order; identifiers are trimmed texts, so that "007" and "7" are two people.
 */
export interface Identities {
  /** True when the row is left out as a duplicate. */
  leavesOut(id: string): boolean;
}

/** Bits looked at for one text lie within one block, so that a text costs one access to far memory. */
const BLOCK_WORDS = 16;

/**
 * A set of fixed size that never forgets a text but now and then claims one it has not met (Bloom 1970, Communications
 * of the ACM 13(7), with the bits of a text kept in one block: Putze, Sanders & Singler 2009). With 2^28 bits and
 * 10,000,000 texts fewer than one new text in 20,000 is claimed; what is claimed is counted exactly in another pass.
 */
export class SeenFilter {
  private readonly words: Int32Array;
  private readonly blockMask: number;

  /** Size as a power of two, 9 to 31 (one block to 256 MB). */
  constructor(bitsExponent: number) {
    if (!Number.isInteger(bitsExponent) || bitsExponent < 9 || bitsExponent > 31) {
      throw new RangeError('the filter holds 2^9 to 2^31 bits');
    }
    this.words = new Int32Array(2 ** bitsExponent / 32);
    this.blockMask = this.words.length / BLOCK_WORDS - 1;
  }

  /** Adds the text; false means that it was surely not there before. */
  meet(text: string): boolean {
    let first = 0x811c9dc5;
    let second = 0x9e3779b9;
    for (let index = 0; index < text.length; index += 1) {
      const code = text.charCodeAt(index);
      first = Math.imul(first ^ code, 0x01000193);
      second = Math.imul(second ^ code, 0x85ebca6b);
      second ^= second >>> 13;
    }
    const place = spread(first);
    const block = (place & this.blockMask) * BLOCK_WORDS;
    const some = this.mark(block, spread(second));
    const more = this.mark(block, spread(place ^ second));
    const rest = this.mark(block, spread((place + Math.imul(second, 0x9e3779b1)) | 0));
    return some && more && rest;
  }

  /** Sets three bits of the block, chosen by nine bits of the hash each; true when all of them were set before. */
  private mark(block: number, hash: number): boolean {
    let met = true;
    for (let bits = hash, probe = 0; probe < 3; probe += 1, bits >>>= 9) {
      const at = block + ((bits >>> 5) & (BLOCK_WORDS - 1));
      const word = this.words[at] ?? 0;
      const flag = 1 << (bits & 31);
      if ((word & flag) === 0) {
        met = false;
        this.words[at] = word | flag;
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
