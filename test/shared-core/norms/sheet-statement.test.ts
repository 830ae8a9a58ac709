import { describe, expect, it } from 'vitest';
import { alternatives } from '../../../shared-core/norms/alternatives.ts';
import { withBlock, withExtent } from '../../../shared-core/norms/booklet-choice.ts';
import type { NormProject, SheetChoices } from '../../../shared-core/norms/norm-project.ts';
import { sheetStatement } from '../../../shared-core/norms/sheet-statement.ts';
import { statementText } from '../../../shared-core/norms/statements.ts';
import { stationContents } from '../../../shared-core/norms/station-contents.ts';
import { settledProject } from './small-projects.ts';

const settled = settledProject();
const setSo = (change: Partial<SheetChoices>): NormProject => ({ ...settled, sheet: { ...settled.sheet, ...change } });
const told = (change: Partial<SheetChoices>): string => statementText(sheetStatement(setSo(change)));

describe('the statement of the sheet', () => {
  it('tells every choice', () => {
    const text = told({
      ...withExtent(settled.sheet, 'whole'),
      paper: 'a5',
      orientation: 'landscape',
      tableColumns: 4,
      marginMm: 14,
      gutterMm: 10,
      rowType: 7.5,
      rowHeight: 10,
      fives: false,
      rangeRows: true,
      fillToFours: true,
      ogive: false,
      inverse: false,
    });
    expect(text).toBe(
      'The booklet is a whole booklet, on A5, landscape, with margins of 14 mm, 10 mm more at the binding edge and ' +
        'blank pages to a multiple of four. Tables stand in four columns, figures of 7.5 points on rows of 10 points, ' +
        'evenly spaced, with one row for scores that print alike. Each comes without a picture and without an inverse table.',
    );
  });

  it('counts blocks of one’s own choice, and speaks of sheets only where they are printed', () => {
    const some = withBlock(settled.sheet, 'colophon', { printed: true });
    expect(told(some)).toContain('The booklet is 2 blocks of your own choice, on A4');
    const colophon = withBlock(some, 'tables', { printed: false });
    expect(told(colophon)).toContain('The booklet is one block of your own choice, on A4');
    expect(told(colophon)).not.toContain('Each comes');
    expect(told(withBlock(colophon, 'colophon', { printed: false }))).toContain('as no block is ticked, on A4');
  });

  it('offers one’s own choice of blocks only where it is the present one', () => {
    const labels = (sheet: SheetChoices): readonly string[] =>
      alternatives({ ...settled, sheet }, 'booklet').map(({ label, chosen }) => `${label}${chosen ? ' *' : ''}`);
    expect(labels(settled.sheet)).toEqual(['a sheet for each table *', 'a whole booklet']);
    expect(labels(withBlock(settled.sheet, 'colophon', { printed: true }))).toEqual([
      'a sheet for each table',
      'a whole booklet',
      'blocks of your own choice *',
    ]);
  });

  it('is told in brief in the list of stations', () => {
    const brief = (sheet: SheetChoices): string => stationContents({ ...settled, sheet }, 0).sheet;
    expect(brief(settled.sheet)).toBe('A4, three columns');
    expect(brief(withExtent(settled.sheet, 'whole'))).toBe('whole booklet, A4');
    const some = withBlock(settled.sheet, 'colophon', { printed: true });
    expect(brief(some)).toBe('booklet of 2 blocks, A4');
    expect(brief(withBlock(some, 'tables', { printed: false }))).toBe('booklet of one block, A4');
    expect(brief(withBlock(settled.sheet, 'tables', { printed: false }))).toBe('A4, three columns');
  });
});
