import { describe, expect, it } from 'vitest';
import { givenKind } from '../../../shared-core/norms/file-endings.ts';

describe('a file from outside', () => {
  it('is a project or a class by its ending, and a cohort otherwise', () => {
    expect(givenKind('/surveys/Grade 4.NORMLOOM')).toBe('project');
    expect(givenKind('/surveys/edition-1.0.NormEdition')).toBe('project');
    expect(givenKind('C:\\lists\\Form 5b.NormClass')).toBe('class');
    expect(givenKind('/surveys/scores.csv')).toBe('cohort');
    expect(givenKind('/surveys/normloom')).toBe('cohort');
    expect(givenKind('/surveys/normclass')).toBe('cohort');
  });
});
