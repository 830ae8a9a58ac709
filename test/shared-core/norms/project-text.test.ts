import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { buildNormSet } from '../../../shared-core/norms/norm-set.ts';
import { projectFromText, projectToText } from '../../../shared-core/norms/project-text.ts';
import { drawnProject } from './drawn-project.ts';
import { settledProject, weightedProject } from './small-projects.ts';

const settled = settledProject();
const text = projectToText(settled);

/** Keys that the settled project has no use for. */
const OPTIONAL_KEYS = [
  ...['offset', 'width', 'printed', 'query', 'reason', 'values', 'score', 'to', 'by'],
  ...['degree', 'kept-scores', 'comb', 'every', 'bandwidth', 'after'],
  ...['parts', 'alone', 'alone-squares', 'cluster', 'positions'],
  ...['check', 'lines', 'name', 'key', 'text'],
] as const;

/** The text of the settled project with one value put elsewhere in its JSON. */
function changed(change: (file: Record<string, Record<string, unknown>>) => void): string {
  const file: Record<string, Record<string, unknown>> = JSON.parse(text);
  change(file);
  return JSON.stringify(file);
}

function problemOf(damaged: string): string {
  const read = projectFromText(damaged);
  return read.ok ? 'was read' : read.problem;
}

function keysIn(value: unknown): readonly string[] {
  if (Array.isArray(value)) return value.flatMap(keysIn);
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, item]) => [key, ...keysIn(item)]);
}

describe('the text of a project', () => {
  it('comes back as the same project, then always as the same text, whatever the user typed', () => {
    fc.assert(
      fc.property(drawnProject, (project) => {
        const read = projectFromText(projectToText(project));
        expect(read).toEqual({ ok: true, project });
        if (!read.ok) return;
        const written = projectToText(read.project);
        const again = projectFromText(written);
        expect(again.ok && projectToText(again.project)).toBe(written);
      }),
    );
  });

  it('builds a set or says in a sentence why not, whatever the project', () => {
    fc.assert(
      fc.property(drawnProject, (project) => {
        const built = buildNormSet(project);
        if (!built.ok) expect(built.problem).toMatch(/^[A-Z].*\.$/);
      }),
    );
  });

  it('has keys in small letters with hyphens, and no text of the user among them', () => {
    const known = new Set([...keysIn(JSON.parse(text)), ...OPTIONAL_KEYS]);
    fc.assert(
      fc.property(drawnProject, (project) => {
        const keys = new Set(keysIn(JSON.parse(projectToText(project))));
        for (const key of keys) {
          expect(key).toMatch(/^[a-z][a-z0-9]*(-[a-z0-9]+)*$/);
          expect(known.has(key)).toBe(true);
        }
      }),
    );
  });

  it('is JSON that ends with one line end', () => {
    expect(text.endsWith('}\n')).toBe(true);
    expect(text).toContain('"test-dates": "May 2026"');
    expect(text).toContain('"group-columns"');
  });

  it('leaves unknown keys behind at every depth', () => {
    const more = changed((file) => {
      file['later'] = { than: 'this program' };
      for (const part of ['source', 'reading', 'tally', 'groups', 'curve', 'table', 'sheet', 'release']) {
        (file[part] ?? {})['unknown-key'] = [1];
      }
    });
    expect(projectFromText(more)).toEqual({ ok: true, project: settled });
    const evil = text.replace('{', '{"__proto__": {"title": "x"}, "constructor": 1,');
    expect(projectFromText(evil)).toEqual({ ok: true, project: settled });
  });

  it('keeps answers to questions about groups with the longest of names', () => {
    const answers = [
      { query: `small-group:${JSON.stringify(['x'.repeat(400), 'y'.repeat(400)])}`, reason: 'A pilot.' },
    ];
    const project = { ...settled, release: { ...settled.release, answers } };
    expect(projectFromText(projectToText(project))).toEqual({ ok: true, project });
  });

  it('is read behind a byte order mark', () => {
    expect(projectFromText(`\uFEFF${text}`).ok).toBe(true);
  });
});

describe('a text that cannot be used', () => {
  it('tells of a newer program', () => {
    const newer = text.replace('"version": 4', '"version": 5');
    expect(problemOf(newer)).toBe(
      'This project was saved by a newer Normloom (file version 5; this one reads up to 4). ' +
        'Open it with the newer program; the file was not touched.',
    );
  });

  it('tells when it is no project', () => {
    for (const other of ['[]', '3', 'null', '"normloom-project"', '{}', '{"format":"other"}']) {
      expect(problemOf(other)).toContain('This is not a Normloom project.');
    }
  });

  it('tells when it breaks off, wherever that is', () => {
    for (let part = 1; part < 20; part += 1) {
      expect(problemOf(text.slice(0, Math.floor((text.length * part) / 20)))).toContain('it is not complete JSON');
    }
    expect(problemOf('')).toContain('it is not complete JSON');
  });

  it.each<[string, string, string]>([
    ['an older version', text.replace('"version": 4', '"version": 0'), 'version'],
    ['a version that is no number', text.replace('"version": 4', '"version": "2"'), 'version'],
    ['a missing part', changed((file) => delete file['sheet']), 'sheet'],
    ['a choice that does not exist', text.replace('"half-up"', '"half-down"'), 'table.rounding'],
    ['a date that is none', text.replace('2026-06-15', '15 June'), 'release.date'],
    ['a missing text', changed((file) => delete file['sheet']?.['how-to-read']), 'sheet.how-to-read'],
    ['a hand-changed flow', text.replace('"rows-read": 842', '"rows-read": 843'), 'rows read must equal rows kept'],
    ['a scale without scores', text.replaceAll('"max": 20', '"max": 0'), 'the score scale cannot be used'],
    ['a scale longer than its counts', text.replaceAll('"max": 20', '"max": 21'), 'the tally does not fit'],
    ['a grouping column that is not there', text.replace('"by": [\n   "grade"', '"by": [\n   "sex"'), 'does not fit'],
    ['a count that is no count', text.replace('10,', '1.5,'), 'tally.cells.0.counts.0'],
    ['a count below 0', text.replace('10,', '-1,'), 'tally.cells.0.counts.0'],
    ['a path that leads nowhere', text.replace('"curve": {', '"curve": 1, "other": {'), 'curve'],
  ])('tells of %s', (_, damaged, where) => {
    expect(damaged).not.toBe(text);
    expect(problemOf(damaged)).toMatch(/^The project file is damaged \(.*\)\. Open a backup/);
    expect(problemOf(damaged)).toContain(where);
  });

  it('refuses weights that do not go with the counts', () => {
    const weighted = projectToText(weightedProject());
    expect(projectFromText(weighted).ok).toBe(true);
    expect(problemOf(weighted.replaceAll('"36"', '"0"'))).toContain('the tally does not fit');
    expect(problemOf(weighted.replace('"36"', `"${'9'.repeat(200)}"`))).toContain('the tally does not fit');
    expect(problemOf(weighted.replace('"50"', '"49"'))).toContain('the tally does not fit');
    expect(problemOf(weighted.replace('"50"', '"101"'))).toContain('the tally does not fit');
    expect(problemOf(weighted.replace('"36"', '"-36"'))).toContain('tally.cells.0.weights.2');
    expect(problemOf(weighted.replace('"weight-decimals": 1', '"weight-decimals": null'))).toContain('does not fit');
  });

  it('is never an exception, whatever stands in it', () => {
    fc.assert(fc.property(fc.oneof(fc.string(), fc.json()), (any) => void expect(projectFromText(any).ok).toBe(false)));
    fc.assert(
      fc.property(fc.nat(text.length), fc.nat(text.length), fc.string({ maxLength: 5 }), (from, length, other) => {
        const read = projectFromText(text.slice(0, from) + other + text.slice(from + (length % 40)));
        if (read.ok) buildNormSet(read.project);
        else expect(read.problem).toMatch(/^(The project file is damaged|This is not a|This project was saved)/);
      }),
    );
  });
});

describe('a new project', () => {
  it('can be written and read before anything was chosen', () => {
    const fresh = newProject('Spelling');
    expect(projectFromText(projectToText(fresh))).toEqual({ ok: true, project: fresh });
  });
});
