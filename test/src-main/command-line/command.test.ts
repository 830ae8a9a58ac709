import { describe, expect, it } from 'vitest';
import { readCommand } from '../../../src-main/command-line/command.ts';
import type { TableOptions } from '../../../src-main/command-line/table-options.ts';

function optionsOf(...words: readonly string[]): TableOptions {
  const read = readCommand(['table', 'a.csv', '--score', 'raw', ...words]);
  if (!read.ok) throw new Error(read.problem);
  if (read.value.kind !== 'table') throw new Error(read.value.kind);
  return read.value.options;
}

function problemOf(...words: readonly string[]): string {
  const read = readCommand(words);
  return read.ok ? `understood as ${read.value.kind}` : read.problem;
}

describe('the words of the command line', () => {
  it('ask for help and version anywhere', () => {
    const kindOf = (...words: readonly string[]) => {
      const read = readCommand(words);
      return read.ok ? read.value.kind : read.problem;
    };
    expect(['--help', '--version'].map((word) => kindOf(word))).toEqual(['help', 'version']);
    expect(kindOf('table', '--help')).toBe('help');
    expect(kindOf('press', '--version')).toBe('version');
    expect(kindOf('table', 'a.csv', '--score', 'x', '--help')).toBe('help');
  });

  it('mean the usual things where little is said', () => {
    expect(optionsOf()).toEqual({
      named: { score: 'raw', count: null, weight: null, id: null, cluster: null, by: [] },
      scale: null,
      direction: 'high-is-good',
      missing: [],
      definition: { kind: 'midpoint' },
      smoothing: { kind: 'none' },
      precision: { interval: null, level: null, reliability: null, bootstrap: null },
      points: [],
      pointDefinitions: ['inverse'],
      columns: null,
      format: 'text',
    });
  });

  it('can stand in any order, with an equals sign or without', () => {
    const read = readCommand(['table', '--by=grade', '--score', 'raw', 'a.csv', '--format', 'json']);
    expect(read).toMatchObject({ ok: true, value: { kind: 'table', path: 'a.csv', options: { format: 'json' } } });
    expect(readCommand(['press', '--into', 'out', 'p.normloom'])).toEqual({
      ok: true,
      value: { kind: 'press', path: 'p.normloom', into: 'out' },
    });
    expect(readCommand(['press', '--into=out', '--', '-odd.normloom'])).toMatchObject({
      value: { path: '-odd.normloom' },
    });
  });

  it('name columns, commas in quotes', () => {
    expect(
      optionsOf('--count', 'n', '--weight', 'w', '--id', 'pupil', '--cluster', 'school', '--by', 'grade, form').named,
    ).toEqual({
      score: 'raw',
      count: 'n',
      weight: 'w',
      id: 'pupil',
      cluster: 'school',
      by: ['grade', 'form'],
    });
    expect(optionsOf('--by', '"grade, or year",form').named.by).toEqual(['grade, or year', 'form']);
    expect(optionsOf('--by', '').named.by).toEqual([]);
    expect(optionsOf('--missing', '99,abs, ,-9').missing).toEqual(['99', 'abs', '-9']);
    expect(optionsOf('--missing', '-9').missing).toEqual(['-9']);
  });

  it('declare scales, also from below 0', () => {
    const scaleOf = (...words: readonly string[]) => {
      const { scale } = optionsOf(...words);
      return scale && [scale.min, scale.max, scale.step];
    };
    expect(scaleOf('--scale', '0:40')).toEqual([0, 40, 1]);
    expect(scaleOf('--scale', '0:20:0.5')).toEqual([0, 20, 0.5]);
    expect(scaleOf('--scale=-5:5')).toEqual([-5, 5, 1]);
    expect(scaleOf('--scale', '-5:5')).toEqual([-5, 5, 1]);
    expect(scaleOf('--scale', '-.5:.5:.25')).toEqual([-0.5, 0.5, 0.25]);
    expect(optionsOf('--scale', '0:9', '--low-is-good').scale?.direction).toBe('low-is-good');
  });

  it('choose definitions, points, columns and format', () => {
    expect(optionsOf('--definition', 'plotting-position:3/8').definition).toEqual({
      kind: 'plotting-position',
      offset: '3/8',
    });
    expect(optionsOf('--definition', 'grouped:2.5').definition).toEqual({ kind: 'grouped', width: 2.5 });
    const pointed = optionsOf('--points', '0,.25,0.5,1', '--point-definition', 'type-7,inverse');
    expect([pointed.points, pointed.pointDefinitions]).toEqual([
      [0, 0.25, 0.5, 1],
      ['type-7', 'inverse'],
    ]);
    expect(optionsOf('--columns', 'z,exact-rank').columns).toEqual(['z', 'exact-rank']);
    expect(optionsOf('--columns', '').columns).toEqual([]);
  });

  it('choose intervals, level, reliability and bootstrap', () => {
    expect(optionsOf('--interval', 'jeffreys', '--level', '99.9', '--reliability', '.88').precision).toEqual({
      interval: 'jeffreys',
      level: 99.9,
      reliability: 0.88,
      bootstrap: null,
    });
    expect(optionsOf('--bootstrap', '500').precision.bootstrap).toEqual({ replicates: 500, seed: 1 });
    expect(optionsOf('--bootstrap', '19', '--level', '90', '--seed', '0').precision.bootstrap).toEqual({
      replicates: 19,
      seed: 0,
    });
  });

  it('ask why ranks differ', () => {
    const differ = (...words: readonly string[]) =>
      readCommand(['differ', 'a.csv', '--score', 's', '--ranks', 'r.txt', ...words]);
    expect(differ('--by', 'g,h', '--group', '5,"a, b"', '--format', 'json', '--low-is-good')).toEqual({
      ok: true,
      value: {
        kind: 'differ',
        path: 'a.csv',
        options: {
          named: { score: 's', count: null, weight: null, id: null, cluster: null, by: ['g', 'h'] },
          scale: null,
          direction: 'low-is-good',
          missing: [],
          group: ['5', 'a, b'],
          ranks: 'r.txt',
          format: 'json',
        },
      },
    });
    expect(differ()).toMatchObject({ value: { options: { group: [], format: 'text' } } });
    expect(differ('--help')).toEqual({ ok: true, value: { kind: 'help' } });
  });

  it.each<[readonly string[], string]>([
    [[], 'Tell what to do'],
    [['tables'], 'There is no command "tables"'],
    [['--foo'], "Unknown option '--foo'."],
    [['table'], 'table takes one file, not 0'],
    [['table', 'a', 'b', '--score', 's'], 'table takes one file, not 2'],
    [['table', 'a'], '--score COL'],
    [['table', 'a', '--score'], "'--score <value>' argument missing"],
    [['table', 'a', '--score', 's', '--score', 't'], '--score is given twice'],
    [['table', 'a', '--score', 's', '--by', 's'], 'Column "s" is given two kinds of work'],
    [['table', 'a', '--score', 's', '--by', 'g,g'], 'Column "g" is given two kinds of work'],
    [['table', 'a', '--score', 's', '--by', '"g'], '--by is a list with commas'],
    [['table', 'a', '--score', 's', '--smooth'], "'--smooth <value>' argument missing"],
    [['table', 'a', '--score', 's', '--into', 'f'], "Unknown option '--into'."],
    [['table', 'a', '--score', 's', '-s'], "Unknown option '-s'."],
    [['table', 'a', '--score', 's', '--scale', '40'], '--scale is MIN:MAX'],
    [['table', 'a', '--score', 's', '--scale', '0:40:1:2'], '--scale is MIN:MAX'],
    [['table', 'a', '--score', 's', '--scale', '0:forty'], '--scale is MIN:MAX'],
    [['table', 'a', '--score', 's', '--scale', '0::1'], '--scale is MIN:MAX'],
    [['table', 'a', '--score', 's', '--scale', '40:0'], 'must lie above the lowest'],
    [['table', 'a', '--score', 's', '--scale', '0:40:3'], 'never reaches 40'],
    [['table', 'a', '--score', 's', '--scale', '0:40:0'], 'must be above 0'],
    [['table', 'a', '--score', 's', '--definition', 'mean'], '--definition is midpoint'],
    [['table', 'a', '--score', 's', '--definition', 'plotting-position:1'], '--definition is midpoint'],
    [['table', 'a', '--score', 's', '--points', '50'], 'proportions from 0 to 1'],
    [['table', 'a', '--score', 's', '--points', '0.5,x'], 'proportions from 0 to 1'],
    [['table', 'a', '--score', 's', '--points=-0.1'], 'proportions from 0 to 1'],
    [['table', 'a', '--score', 's', '--point-definition', 'type-7'], 'needs --points'],
    [['table', 'a', '--score', 's', '--points', '0', '--point-definition', 'type-10'], '--point-definition knows'],
    [['table', 'a', '--score', 's', '--columns', 'iq'], '--columns knows count'],
    [['table', 'a', '--score', 's', '--columns', 't,t'], '--columns names a column twice'],
    [['table', 'a', '--score', 's', '--points', '0.5', '--format', 'csv'], 'csv has no place for percentile points'],
    [['table', 'a', '--score', 's', '--format', 'xml'], '--format knows text, csv, json'],
    [['table', 'a', '--score', 's', '--low-is-good=yes'], "'--low-is-good' does not take an argument"],
    [['table', 'a', '--score', 's', '--interval', 'wald'], '--interval knows wilson, clopper-pearson, jeffreys'],
    [['table', 'a', '--score', 's', '--level', '49'], '--level 49: The level of an interval lies between 50'],
    [['table', 'a', '--score', 's', '--level', 'high'], '--level high: The level'],
    [['table', 'a', '--score', 's', '--reliability', '1.1'], '--reliability 1.1: A reliability is a number from 0'],
    [['table', 'a', '--score', 's', '--bootstrap', '38'], 'needs from 39 to 20000 replicates'],
    [['table', 'a', '--score', 's', '--bootstrap', '99.5'], 'needs from 39 to 20000 replicates'],
    [['table', 'a', '--score', 's', '--bootstrap', '1000', '--level', '99.9'], 'needs from 1999'],
    [['table', 'a', '--score', 's', '--bootstrap', '99', '--seed', '-1'], '--seed -1: A seed is a whole number'],
    [['table', 'a', '--score', 's', '--seed', '3'], '--seed needs --bootstrap R'],
    [['table', 'a', '--score', 's', '--bootstrap', '99', '--format', 'csv'], 'csv has no place for a bootstrap'],
    [['table', 'a', '--score', 's', '--bootstrap', '99', '--definition', 'grouped:5'], 'a rank that counts people'],
    [['table', 'a', '--score', 's', '--columns', 'measurement-band'], 'needs --reliability R'],
    [['differ', 'a', '--score', 's'], '--ranks RANKFILE'],
    [['differ', '--score', 's', '--ranks', 'r'], 'differ takes one file, not 0'],
    [['differ', 'a', '--ranks', 'r'], '--score COL'],
    [['differ', 'a', '--score', 's', '--ranks', 'r', '--by', 'g'], '--by needs --group VALUE'],
    [['differ', 'a', '--score', 's', '--ranks', 'r', '--group', '5'], '--group needs --by COL'],
    [['differ', 'a', '--score', 's', '--ranks', 'r', '--by', 'g,h', '--group', '5'], 'each column of --by: 2, not 1'],
    [['differ', 'a', '--score', 's', '--ranks', 'r', '--format', 'csv'], '--format knows text, json'],
    [['differ', 'a', '--score', 's', '--ranks', 'r', '--columns', 't'], "Unknown option '--columns'."],
    [['press', 'p.normloom'], '--into FOLDER'],
    [['press', 'p.normloom', '--into', ''], '--into FOLDER'],
    [['press', '--into', 'f'], 'press takes one project, not 0'],
    [['press', 'p.normloom', '--into', 'f', '--score', 's'], "Unknown option '--score'."],
  ])('%j are wrong', (words, problem) => {
    expect(problemOf(...words)).toContain(problem);
    expect(problemOf(...words)).toMatch(/\.$/);
  });
});
