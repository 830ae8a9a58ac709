import { expect, it } from 'vitest';
import { classContents } from '../../../shared-core/class/class-contents.ts';
import { newClass } from '../../../shared-core/class/new-class.ts';
import { sortClass } from '../../../shared-core/class/sorted-class.ts';
import { answered, classOf } from './classes.ts';

it('says of every station what it holds, and counts what is open', () => {
  expect(classContents(newClass('', 1), [])).toEqual({
    table: 'none: class standing',
    list: 'nobody yet',
    questions: 'none',
    report: 'A4, English',
    slips: 'none',
    press: 'with names',
  });
  const file = classOf([
    ['Ada', '7'],
    ['Ben', '99'],
    ['Cem', ''],
  ]);
  const some = answered(file, [2], 'value', '9');
  const all = answered(some, [3], 'absent');
  const asked = [file, some, all].map((one) => classContents(one, sortClass(one).questions));
  expect(asked.map(({ questions }) => questions)).toEqual(['2 of 2 open', '1 of 2 open', '2 answered']);
  expect(asked[0]).toMatchObject({ table: file.table?.title, list: '3 pupils', slips: '4 to a page, English' });
  const summary = { ...file, sharing: { ...file.sharing, as: 'summary' as const } };
  expect(classContents(summary, [])).toMatchObject({ slips: 'none', press: 'as a summary' });
});
