import { describe, expect, it } from 'vitest';
import type { FrozenEdition } from '../../../shared-core/norms/edition-file.ts';
import { nextEdition, raisedEdition } from '../../../shared-core/norms/next-edition.ts';
import { builtSet, settledProject } from './small-projects.ts';

describe('the number of the next edition', () => {
  it.each([
    ['1.0', '1.1'],
    ['2.9', '2.10'],
    ['1.2.3', '1.2.4'],
    ['3', '3.1'],
    ['2026', '2026.1'],
    ['Autumn', 'Autumn.1'],
    ['Autumn.1', 'Autumn.2'],
    ['1.0b', '1.0b.1'],
    ['1.', '1..1'],
    [`${'x'.repeat(38)}.9`, `${'x'.repeat(38)}.9`],
    ['x'.repeat(39), 'x'.repeat(39)],
  ])('after %s is %s', (edition, next) => {
    expect(raisedEdition(edition)).toBe(next);
  });
});

describe('a project that goes on from a released edition', () => {
  const project = settledProject();
  const { check } = builtSet(project);
  const released: FrozenEdition = {
    program: { name: 'Normloom', version: '0.3.0' },
    edition: '1.0',
    date: '2026-06-15',
    check,
    analyst: 'A. Weir',
    checker: 'J. Lund',
    files: [],
    readBack: { cellsCompared: 1, cellsRecomputed: 1 },
    project,
  };

  it('keeps every choice but the number and the signatures, and names what it goes on from', () => {
    const { release, ...choices } = nextEdition(released);
    const { release: before, ...same } = project;
    expect(choices).toEqual(same);
    expect(release).toEqual({
      ...before,
      edition: '1.1',
      analyst: '',
      checker: '',
      changes: { edition: '1.0', date: '2026-06-15', check, lines: [] },
    });
  });
});
