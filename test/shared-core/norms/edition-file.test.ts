import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  EDITION_VERSION,
  editionFromText,
  editionToText,
  projectOrEditionFromText,
  type FrozenEdition,
} from '../../../shared-core/norms/edition-file.ts';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { drawnProject } from './drawn-project.ts';
import { builtSet, settledProject } from './small-projects.ts';

const project = settledProject();

const EDITION: FrozenEdition = {
  program: { name: 'Normloom', version: '0.3.0' },
  edition: '1.0',
  date: '2026-06-15',
  check: builtSet(project).check,
  analyst: 'A. Weir',
  checker: 'J. Lund',
  files: [{ file: 'booklet.pdf', bytes: 4711, sha256: 'c'.repeat(64) }],
  readBack: { cellsCompared: 512, cellsRecomputed: 256 },
  project,
};

const TEXT = editionToText(EDITION);

describe('an edition file', () => {
  it('gives back what was frozen, with keys in lower case and hyphens', () => {
    expect(editionFromText(TEXT)).toEqual({ ok: true, edition: EDITION });
    expect(editionFromText(`\uFEFF${TEXT}`)).toEqual({ ok: true, edition: EDITION });
    const keys = [...TEXT.matchAll(/^ "([^"]+)":/gm)].map(([, key]) => key);
    expect(keys).toEqual([
      ...['format', 'version', 'program', 'edition', 'date', 'check', 'analyst', 'checker', 'files', 'read-back'],
      ...['project', 'seal'],
    ]);
    expect(TEXT).not.toMatch(/"[a-z-]*[A-Z][A-Za-z]*":/);
    expect(TEXT.endsWith('}\n')).toBe(true);
  });

  it('is read again after its blanks were changed, and refused after anything else was', () => {
    expect(editionFromText(JSON.stringify(JSON.parse(TEXT)))).toMatchObject({ ok: true });
    const harmed: readonly (readonly [string, string])[] = [
      ['"A. Weir"', '"B. Weir"'],
      ['"bytes": 4711', '"bytes": 4712'],
      ['"rounding": "half-up"', '"rounding": "half-even"'],
      ['"population": "All pupils', '"population": "Most pupils'],
      ['"seal": "', '"seal": "0'],
      ['"seal"', '"sealed"'],
    ];
    for (const [good, bad] of harmed) {
      expect(TEXT).toContain(good);
      const read = editionFromText(TEXT.replace(good, bad));
      expect([bad, read.ok ? 'was read' : read.problem]).toEqual([
        bad,
        'The edition file is damaged (its seal does not fit: something in it was changed after the release). ' +
          'Use another copy of it; the file was not touched.',
      ]);
    }
    const cut = editionFromText(TEXT.slice(0, 900));
    expect(cut.ok ? '' : cut.problem).toContain('not complete JSON');
  });

  it('of a newer program, or of another kind, is refused with what to do', () => {
    const newer = editionFromText(TEXT.replace(`"version": ${EDITION_VERSION},`, '"version": 9,'));
    expect(newer.ok ? '' : newer.problem).toContain('released by a newer Normloom (file version 9');
    const other = editionFromText(projectToText(project));
    expect(other.ok ? '' : other.problem).toContain('This is not a released edition.');
  });

  it('is told from a project by its content', () => {
    expect(projectOrEditionFromText(TEXT)).toEqual({ ok: true, project, edition: EDITION });
    expect(projectOrEditionFromText(projectToText(project))).toEqual({ ok: true, project, edition: null });
    const neither = projectOrEditionFromText('{"format":"other"}');
    expect(neither.ok ? '' : neither.problem).toContain('This is not a Normloom project.');
    const torn = projectOrEditionFromText('{');
    expect(torn.ok ? '' : torn.problem).toContain('damaged');
  });

  it('holds any project without loss', () => {
    fc.assert(
      fc.property(drawnProject, fc.string(), (drawn, name) => {
        const edition = { ...EDITION, analyst: name, project: drawn };
        const text = editionToText(edition);
        expect(editionFromText(text)).toEqual({ ok: true, edition });
        expect(editionToText(edition)).toBe(text);
      }),
      { numRuns: 60 },
    );
  });
});
