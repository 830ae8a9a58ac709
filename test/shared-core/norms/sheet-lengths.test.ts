import * as v from 'valibot';
import { describe, expect, it } from 'vitest';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { SHEET_LENGTHS, sheetLengthProblem, type SheetLength } from '../../../shared-core/norms/sheet-lengths.ts';
import { sheetSchema } from '../../../shared-core/norms/sheet-schema.ts';

const { sheet } = newProject('');
const LENGTHS: readonly SheetLength[] = ['marginMm', 'gutterMm', 'rowType', 'rowHeight'];

describe('a length of the sheet', () => {
  it.each(LENGTHS)(
    'is taken within its range and refused outside it, by the sentence as by the schema: %s',
    (length) => {
      const [least, most] = SHEET_LENGTHS[length];
      const roomy = { ...sheet, rowType: 6, rowHeight: 36 };
      for (const value of [least, most, (least + most) / 2]) {
        expect(sheetLengthProblem(roomy, length, value)).toBeNull();
        expect(v.safeParse(sheetSchema, { ...roomy, [length]: value }).success).toBe(true);
      }
      for (const value of [least - 0.1, most + 0.1, NaN, Infinity]) {
        expect(sheetLengthProblem(roomy, length, value)).toContain(`${least} to ${most}`);
        expect(v.safeParse(sheetSchema, { ...roomy, [length]: value }).success).toBe(false);
      }
    },
  );

  it('is refused where figures would not fit on their rows', () => {
    expect(sheetLengthProblem(sheet, 'rowType', 12.4)).toBeNull();
    expect(sheetLengthProblem(sheet, 'rowType', 12.5)).toBe(
      'Figures of 12.5 points do not fit on rows of 12.4 points. Make the rows higher first.',
    );
    expect(sheetLengthProblem(sheet, 'rowHeight', 8.7)).toBeNull();
    expect(sheetLengthProblem(sheet, 'rowHeight', 8.6)).toBe(
      'Rows of 8.6 points do not hold figures of 8.7 points. Make the figures smaller first.',
    );
  });
});
