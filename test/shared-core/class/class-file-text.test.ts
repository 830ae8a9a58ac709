import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { classFromText, classToText } from '../../../shared-core/class/class-file-text.ts';
import { classResults } from '../../../shared-core/class/class-results.ts';
import { classStanding } from '../../../shared-core/class/class-standing.ts';
import { newClass } from '../../../shared-core/class/new-class.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { projectFromText, projectToText } from '../../../shared-core/norms/project-text.ts';
import { classOf } from './classes.ts';
import { drawnClass } from './drawn-class.ts';

const file = classOf([
  ['=Ada', '7'],
  ['Ivo', 'absent', '10'],
]);
const text = classToText(file);

function problemOf(damaged: string): string {
  const read = classFromText(damaged);
  return read.ok ? 'was read' : read.problem;
}

function keysIn(value: unknown): readonly string[] {
  if (Array.isArray(value)) return value.flatMap(keysIn);
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, item]) => [key, ...keysIn(item)]);
}

describe('the text of a class', () => {
  it('comes back as the same class, whatever was typed', () => {
    fc.assert(
      fc.property(drawnClass, (drawn) => {
        const written = classToText(drawn);
        expect(classFromText(written)).toEqual({ ok: true, file: drawn });
        for (const key of keysIn(JSON.parse(written))) expect(key).toMatch(/^[a-z][a-z0-9]*(-[a-z0-9]+)*$/);
      }),
    );
  });

  it('comes back with a table of a project, and as a new class', () => {
    expect(classFromText(text)).toEqual({ ok: true, file });
    const fresh = newClass('5a', 3);
    expect(classFromText(classToText(fresh))).toEqual({ ok: true, file: fresh });
    expect(text.endsWith('}\n')).toBe(true);
  });

  it('gives results and a standing, whatever the class', () => {
    fc.assert(
      fc.property(drawnClass, (drawn) => {
        expect(classResults(drawn).ok).toBe(drawn.table !== null);
        expect(classStanding(drawn).counts.rows).toBe(drawn.list.rows.length);
      }),
    );
  });

  it('leaves unknown keys behind', () => {
    expect(classFromText(text.replace('{', '{"later": [1], "__proto__": {"title": "x"},'))).toEqual({ ok: true, file });
  });
});

describe('a text that cannot be used', () => {
  it.each<[string, string, string]>([
    [
      'no class',
      projectToText(newProject('x')),
      'This is not a Normloom class. Choose a file that Normloom saved (*.normclass).',
    ],
    [
      'a newer class',
      text.replace('"version": 1', '"version": 2'),
      'This class was saved by a newer Normloom (file version 2; this one reads up to 1).',
    ],
    ['a class that breaks off', text.slice(0, 900), 'The class file is damaged (it is not complete JSON'],
    ['another version', text.replace('"version": 1', '"version": 0'), '(version:'],
    ['a missing text', text.replace('"scoreText"', '"x"').replace('"score-text"', '"x"'), 'score-text'],
    ['a gap in the table', text.replace('"low": 5,', '"low": 4,'), 'the rows of a group do not fit the scale'],
    [
      'a text too few',
      text.replace(/"texts": \[\s*"[^"]*",/, '"texts": ['),
      'the texts of a row are not those of the columns',
    ],
    ['a rank that is none', text.replace('"printed": "50"', '"printed": "fifty"'), 'printed'],
    ['a choice that does not exist', text.replace('"per-page": 4', '"per-page": 5'), 'slips.per-page'],
  ])('tells of %s', (_, damaged, words) => {
    expect(damaged).not.toBe(text);
    expect(problemOf(damaged)).toContain(words);
    expect(problemOf(damaged)).toMatch(/^[A-Z].*\.$/);
  });

  it('is never an exception, and no project', () => {
    fc.assert(
      fc.property(fc.nat(text.length), fc.nat(40), fc.string({ maxLength: 5 }), (from, length, other) => {
        const read = classFromText(text.slice(0, from) + other + text.slice(from + length));
        if (read.ok) classResults(read.file);
        else expect(read.problem).toMatch(/^(The class file is damaged|This is not a|This class was saved)/);
      }),
    );
    expect(projectFromText(text)).toMatchObject({
      ok: false,
      problem: expect.stringContaining('This is not a Normloom project.'),
    });
  });
});
