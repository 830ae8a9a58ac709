import { describe, expect, it } from 'vitest';
import { blockHolds, BLOCK_NAMES, blocksInWords } from '../../../shared-core/norms/blocks-in-words.ts';
import { BLOCK_KINDS } from '../../../shared-core/norms/booklet-blocks.ts';
import { withBlock, withBlockAt } from '../../../shared-core/norms/booklet-choice.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { settledProject } from './small-projects.ts';

const settled = settledProject();

describe('what a block holds', () => {
  it('is told in one sentence, another for each, under a name of its own', () => {
    const sentences = BLOCK_KINDS.map((kind) => blockHolds(settled, kind));
    expect(sentences.every((sentence) => /^[A-Z].*\.$/.test(sentence))).toBe(true);
    expect(new Set(sentences).size).toBe(BLOCK_KINDS.length);
    expect(new Set(Object.values(BLOCK_NAMES)).size).toBe(BLOCK_KINDS.length);
  });

  it('counts the tables that are printed', () => {
    expect(blockHolds(settled, 'tables')).toBe('A sheet for each of 2 tables.');
    const choices = [{ values: ['4'], title: '', printed: false }];
    expect(blockHolds({ ...settled, groups: { ...settled.groups, choices } }, 'tables')).toBe(
      'One sheet for the one table.',
    );
  });

  it('says why a block would print nothing yet', () => {
    const cut = { name: 'Support', score: 7, values: null };
    expect(blockHolds(settled, 'cut-scores')).toBe('Prints nothing yet: no cut score is named.');
    expect(blockHolds({ ...settled, cuts: [cut] }, 'cut-scores')).toContain('One raw score');
    expect(blockHolds({ ...settled, cuts: [cut, cut] }, 'cut-scores')).toContain('2 raw scores');
    expect(blockHolds(settled, 'change-list')).toMatch(/^Prints nothing yet/);
    const changes = { edition: '0.9', date: '2025-06-15', check: 'ABCD-1234', lines: ['Grade 4: 3 ranks'] };
    const compared = { ...settled, release: { ...settled.release, changes } };
    expect(blockHolds(compared, 'change-list')).toBe('What changed since edition 0.9.');
  });
});

describe('the blocks in words', () => {
  it('are the printed ones in print order', () => {
    const project = newProject('');
    expect(blocksInWords(project)).toBe('tables');
    const ticked = withBlock(project.sheet, 'cautions', { printed: true });
    expect(blocksInWords({ ...project, sheet: withBlockAt(ticked, 'cautions', 0) })).toBe('cautions, tables');
    expect(blocksInWords({ ...project, sheet: withBlock(project.sheet, 'tables', { printed: false }) })).toBe('');
  });
});
