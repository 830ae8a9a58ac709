import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { PROJECT_VERSION, type NormProject } from '../../../shared-core/norms/norm-project.ts';
import { projectFromText, projectToText } from '../../../shared-core/norms/project-text.ts';
import { drawnProject } from './drawn-project.ts';
import { builtSet, settledProject } from './small-projects.ts';

/** A project as version 1 of the file wrote it, word for word. */
const VERSION_1 = `{
 "format": "normloom-project",
 "version": 1,
 "title": "Ostrey Vale spelling (invented)",
 "subtitle": "Form A",
 "people": "pupils",
 "source": {
  "kind": "typed",
  "file": "",
  "sha256": "${'a'.repeat(64)}",
  "bytes": 10,
  "rows-read": 10,
  "rows-kept": 10,
  "left-out": [],
  "scale-inferred": false
 },
 "reading": null,
 "tally": {
  "scale": {"min": 0, "max": 4, "step": 1, "direction": "low-is-good"},
  "group-columns": [],
  "weight-decimals": null,
  "cells": [{"values": [], "counts": [1, 2, 3, 0, 4], "weights": null, "squares": null}]
 },
 "groups": {
  "by": [],
  "choices": [{"values": [], "title": "Everyone", "printed": true}],
  "documentation": {"population": "All.", "sampling": "", "participation": "", "test-dates": "May 2026", "weighting": ""}
 },
 "curve": {"definition": {"kind": "plotting-position", "offset": "3/8"}},
 "table": {
  "columns": ["count", "exact-rank", "t"],
  "decimals": 1,
  "rounding": "half-even",
  "ends": "held",
  "z-source": "normalised",
  "z-ends": "half-person"
 },
 "sheet": {
  "paper": "letter",
  "orientation": "landscape",
  "table-columns": 2,
  "title": "Spelling",
  "how-to-read": "Look.",
  "cautions": "Beware.",
  "notes": "",
  "ogive": true,
  "inverse": true
 },
 "release": {"edition": "0.9", "date": "2026-05-30", "answers": [{"query": "documentation", "reason": "Later."}]}
}
`;

/** The text of a project without anything that version 1 did not know. */
function asVersion1(project: NormProject): string {
  const file = JSON.parse(projectToText(project));
  delete file.precision;
  delete file.curve.smoothing;
  delete file.curve.exceptions;
  return JSON.stringify({ ...file, ...withoutClusters(project), version: 1 });
}

/** The text of a project without anything that version 2 did not know. */
function asVersion2(project: NormProject): string {
  return JSON.stringify({ ...JSON.parse(projectToText(project)), ...withoutClusters(project), version: 2 });
}

/** Tally and reading as versions 1 and 2 wrote them. */
function withoutClusters(project: NormProject): object {
  const { tally, reading } = JSON.parse(projectToText(project));
  for (const cell of tally?.cells ?? []) delete cell.clusters;
  if (reading !== null) delete reading.decisions['blank-cluster'];
  return { tally, reading };
}

/** The project as it is where nothing is known of clusters. */
function oneByOne(project: NormProject): NormProject {
  const { tally, reading } = project;
  return {
    ...project,
    tally: tally && { ...tally, cells: tally.cells.map((cell) => ({ ...cell, clusters: null })) },
    reading: reading && { ...reading, decisions: { ...reading.decisions, blankCluster: 'alone' } },
  };
}

const fresh = newProject('');

describe('a project of version 1', () => {
  it('is brought forward without smoothing, with the usual precision', () => {
    const read = projectFromText(VERSION_1);
    if (!read.ok) throw new Error(read.problem);
    const { project } = read;
    expect(project.version).toBe(PROJECT_VERSION);
    expect(project.sheet).toEqual({
      ...fresh.sheet,
      paper: 'letter',
      orientation: 'landscape',
      tableColumns: 2,
      title: 'Spelling',
      howToRead: 'Look.',
      cautions: 'Beware.',
      inverse: true,
    });
    expect(project.curve).toEqual({
      definition: { kind: 'plotting-position', offset: '3/8' },
      smoothing: { kind: 'none' },
      exceptions: [],
    });
    expect(project.precision).toEqual({
      interval: 'wilson',
      level: 95,
      reliability: null,
      bootstrap: { replicates: 1000, seed: 1 },
    });
    expect(project.table.columns).toEqual(['count', 'exact-rank', 't']);
    expect(project.release.answers).toEqual([{ query: 'documentation', reason: 'Later.' }]);
    // Mean ranks 10, 8.5, 6, 4.5 and 2.5 from the poor end, which is the high one: (r − 3/8)/10.25.
    expect(builtSet(project).groups[0]?.rows.map(({ printed }) => printed)).toEqual([
      '93.9',
      '79.3',
      '54.9',
      '40.2',
      '20.7',
    ]);
  });

  it('is written as the present version and then stays the same', () => {
    const read = projectFromText(VERSION_1);
    if (!read.ok) throw new Error(read.problem);
    const text = projectToText(read.project);
    expect(JSON.parse(text).version).toBe(PROJECT_VERSION);
    expect(projectFromText(text)).toEqual(read);
  });

  it('keeps everything else, whatever stands in it', () => {
    fc.assert(
      fc.property(drawnProject, (project) => {
        const { definition } = project.curve;
        const curve: NormProject['curve'] = { definition, smoothing: { kind: 'none' }, exceptions: [] };
        const expected: NormProject = { ...oneByOne(project), curve, precision: fresh.precision };
        expect(projectFromText(asVersion1(project))).toEqual({ ok: true, project: expected });
      }),
    );
  });

  it('prints what it printed before', () => {
    const project = settledProject();
    const read = projectFromText(asVersion1(project));
    expect(read.ok && builtSet(read.project).groups).toEqual(builtSet(project).groups);
  });

  it.each<[string, string, string]>([
    ['the Curve station', VERSION_1.replace('"curve": {', '"curve": 1, "other": {'), 'curve'],
    ['the definition', VERSION_1.replace('"plotting-position"', '"guess"'), 'curve.definition.kind'],
    ['the table', VERSION_1.replace('"half-even"', '"up"'), 'table.rounding'],
  ])('tells what is damaged: %s', (_, damaged, where) => {
    const read = projectFromText(damaged);
    expect(read.ok ? '' : read.problem).toMatch(/^The project file is damaged \(/);
    expect(read.ok ? '' : read.problem).toContain(`(${where}: `);
  });
});

describe('a project of version 2', () => {
  it('is brought forward with its people drawn one by one, and nothing else changes', () => {
    fc.assert(
      fc.property(drawnProject, (project) => {
        expect(projectFromText(asVersion2(project))).toEqual({ ok: true, project: oneByOne(project) });
      }),
    );
  });

  it('prints what it printed before', () => {
    const project = settledProject();
    const read = projectFromText(asVersion2(project));
    expect(read.ok && builtSet(read.project)).toEqual(builtSet(project));
  });

  it('is damaged, not crashed on, when its cells are not what they should be', () => {
    const text = asVersion2(settledProject());
    for (const cells of ['7', '[7]', 'null']) {
      const read = projectFromText(text.replace(/"cells":\[.*?\}\]/, `"cells":${cells}`));
      expect(read.ok ? '' : read.problem).toContain('(tally.cells');
    }
  });
});

describe('a project of version 3', () => {
  /** The text of a project without anything that version 3 did not know. */
  function asVersion3(project: NormProject): string {
    const file = JSON.parse(projectToText(project));
    delete file.cuts;
    delete file['class-table'];
    const { edition, date, answers } = file.release;
    const { paper, orientation, title, cautions, notes, ogive, inverse } = file.sheet;
    const [tableColumns, howToRead] = [file.sheet['table-columns'], file.sheet['how-to-read']];
    return JSON.stringify({
      ...file,
      version: 3,
      release: { edition, date, answers },
      sheet: {
        paper,
        orientation,
        title,
        cautions,
        notes,
        ogive,
        inverse,
        'table-columns': tableColumns,
        'how-to-read': howToRead,
      },
    });
  }

  it('is brought forward as its tables alone, in English, unsigned, and nothing else changes', () => {
    fc.assert(
      fc.property(drawnProject, (project) => {
        const { paper, orientation, tableColumns, title, howToRead, cautions, notes, ogive, inverse } = project.sheet;
        const kept = { paper, orientation, tableColumns, title, howToRead, cautions, notes, ogive, inverse };
        const { edition, date, answers } = project.release;
        expect(projectFromText(asVersion3(project))).toEqual({
          ok: true,
          project: {
            ...project,
            sheet: { ...fresh.sheet, ...kept },
            release: { ...fresh.release, edition, date, answers },
            cuts: [],
            classTable: null,
          },
        });
      }),
    );
  });
});

describe('a project of another version', () => {
  it('is refused when it is newer, without a change', () => {
    for (const version of [PROJECT_VERSION + 1, 50, 1000]) {
      const read = projectFromText(VERSION_1.replace('"version": 1', `"version": ${version}`));
      expect(read.ok ? '' : read.problem).toMatch(
        new RegExp(`saved by a newer Normloom \\(file version ${version}; this one reads up to ${PROJECT_VERSION}\\)`),
      );
    }
  });

  it('is damaged when it has what no program wrote', () => {
    for (const version of ['0', '-1', '1.5', '"1"', 'null']) {
      const read = projectFromText(VERSION_1.replace('"version": 1', `"version": ${version}`));
      expect(read.ok ? '' : read.problem).toContain('(version: ');
    }
  });
});

describe('choices of smoothing and precision in a file', () => {
  const text = projectToText({
    ...fresh,
    curve: {
      ...fresh.curve,
      smoothing: { kind: 'log-linear', degree: 4, keptScores: [1], comb: { every: 3, offset: 2 } },
      exceptions: [{ values: [], smoothing: { kind: 'kernel', bandwidth: 0.75, after: null } }],
    },
    precision: { ...fresh.precision, reliability: 0.5 },
  });

  it.each<[string, string, string]>([
    ['"degree": 4', '"degree": 0', 'curve.smoothing.degree'],
    ['"degree": 4', '"degree": 11', 'curve.smoothing.degree'],
    ['"degree": 4', '"degree": "best"', 'curve.smoothing.degree'],
    ['"offset": 2', '"offset": 3', 'a comb starts before its second tooth'],
    ['"every": 3', '"every": 1', 'curve.smoothing.comb.every'],
    ['"kept-scores": [\n    1\n   ]', '"kept-scores": [\n    "1"\n   ]', 'curve.smoothing.kept-scores.0'],
    ['"bandwidth": 0.75', '"bandwidth": 0', 'curve.exceptions.0.smoothing.bandwidth'],
    ['"bandwidth": 0.75', '"bandwidth": 1e300', 'curve.exceptions.0.smoothing.bandwidth'],
    ['"level": 95', '"level": 49', 'precision.level'],
    ['"level": 95', '"level": 99.95', 'precision.level'],
    ['"reliability": 0.5', '"reliability": 1.1', 'precision.reliability'],
    ['"interval": "wilson"', '"interval": "wald"', 'precision.interval'],
    ['"replicates": 1000', '"replicates": 0', 'precision.bootstrap.replicates'],
    ['"seed": 1', '"seed": -1', 'precision.bootstrap.seed'],
  ])('%s may not be %s', (good, bad, where) => {
    expect(projectFromText(text).ok).toBe(true);
    const damaged = text.replace(good, bad);
    expect(damaged).not.toBe(text);
    const read = projectFromText(damaged);
    expect(read.ok ? 'was read' : read.problem).toContain(where);
  });
});
