import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BLOCK_KINDS, blocksIn, prints, type BlockKind } from '../../../shared-core/norms/booklet-blocks.ts';
import {
  bookletExtent,
  inUsualOrder,
  printedBlocks,
  withBlock,
  withBlockAt,
  withExtent,
  withUsualOrder,
} from '../../../shared-core/norms/booklet-choice.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import type { SheetChoices } from '../../../shared-core/norms/norm-project.ts';

const plain = newProject('').sheet;
const kindsOf = (sheet: SheetChoices): readonly BlockKind[] => blocksIn(sheet).map(({ kind }) => kind);

/** Sheets that list some blocks in some order, some of them printed, some with words of their own. */
const drawnSheet: fc.Arbitrary<SheetChoices> = fc
  .tuple(
    fc.shuffledSubarray([...BLOCK_KINDS]),
    fc.array(fc.boolean(), { minLength: BLOCK_KINDS.length, maxLength: BLOCK_KINDS.length }),
    fc.string({ maxLength: 20 }),
  )
  .map(([kinds, printed, heading]) => ({
    ...plain,
    blocks: kinds.map((kind, place) => ({ kind, printed: printed[place] === true, heading, text: '' })),
  }));
const drawnKind = fc.constantFrom(...BLOCK_KINDS);

describe('the extent of a booklet', () => {
  it('is the tables alone in a new project, and follows the ticks', () => {
    expect(bookletExtent(plain)).toBe('tables');
    expect(bookletExtent(withExtent(plain, 'whole'))).toBe('whole');
    expect(bookletExtent(withBlock(plain, 'colophon', { printed: true }))).toBe('own');
    expect(bookletExtent(withBlock(withExtent(plain, 'whole'), 'contents', { printed: false }))).toBe('own');
    const only = withBlock(withBlock(plain, 'tables', { printed: false }), 'inverse', { printed: true });
    expect(bookletExtent(only)).toBe('own');
    expect(bookletExtent(withBlock(plain, 'tables', { printed: false }))).toBe('nothing');
  });

  it('becomes what was asked for and leaves order, headings and texts as they are', () => {
    fc.assert(
      fc.property(drawnSheet, fc.constantFrom('tables' as const, 'whole' as const), (sheet, extent) => {
        const next = withExtent(sheet, extent);
        expect(bookletExtent(next)).toBe(extent);
        expect(printedBlocks(next)).toBe(extent === 'whole' ? BLOCK_KINDS.length : 1);
        const words = ({ blocks }: SheetChoices): unknown =>
          blocksIn({ blocks }).map(({ kind, heading, text }) => [kind, heading, text]);
        expect(words(next)).toEqual(words(sheet));
      }),
    );
  });
});

describe('a block', () => {
  it('is changed alone', () => {
    fc.assert(
      fc.property(drawnSheet, drawnKind, fc.boolean(), (sheet, kind, printed) => {
        const next = withBlock(sheet, kind, { printed, heading: 'Ours' });
        expect(prints(next, kind)).toBe(printed);
        expect(kindsOf(next)).toEqual(kindsOf(sheet));
        const others = ({ blocks }: SheetChoices): unknown =>
          blocksIn({ blocks }).filter((block) => block.kind !== kind);
        expect(others(next)).toEqual(others(sheet));
      }),
    );
  });

  it('moves to its place, and all others keep their order', () => {
    fc.assert(
      fc.property(drawnSheet, drawnKind, fc.integer({ min: -3, max: 20 }), (sheet, kind, place) => {
        const next = kindsOf(withBlockAt(sheet, kind, place));
        expect(next.indexOf(kind)).toBe(Math.max(0, Math.min(BLOCK_KINDS.length - 1, place)));
        const others = (kinds: readonly BlockKind[]): readonly BlockKind[] => kinds.filter((other) => other !== kind);
        expect(others(next)).toEqual(others(kindsOf(sheet)));
      }),
    );
  });

  it('comes back to where it was when it is moved back', () => {
    fc.assert(
      fc.property(drawnSheet, drawnKind, fc.nat(12), (sheet, kind, place) => {
        const before = kindsOf(sheet).indexOf(kind);
        expect(kindsOf(withBlockAt(withBlockAt(sheet, kind, place), kind, before))).toEqual(kindsOf(sheet));
      }),
    );
  });
});

describe('the usual order', () => {
  it('is that of a new project and can be put back', () => {
    expect(inUsualOrder(plain)).toBe(true);
    expect(inUsualOrder(withBlockAt(plain, 'cautions', 0))).toBe(false);
    fc.assert(
      fc.property(drawnSheet, (sheet) => {
        const usual = withUsualOrder(sheet);
        expect(inUsualOrder(usual)).toBe(true);
        expect(kindsOf(usual)).toEqual(BLOCK_KINDS);
        for (const kind of BLOCK_KINDS) expect(prints(usual, kind)).toBe(prints(sheet, kind));
      }),
    );
  });
});
