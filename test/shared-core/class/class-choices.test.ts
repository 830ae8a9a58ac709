import { describe, expect, it } from 'vitest';
import { classOffers } from '../../../shared-core/class/class-choices.ts';
import { columnsToTick, withColumn, withTable } from '../../../shared-core/class/class-columns.ts';
import type { ClassFile } from '../../../shared-core/class/class-file.ts';
import { reportSentence, slipSentence, type ClassSentencePart } from '../../../shared-core/class/class-sentences.ts';
import { newClass } from '../../../shared-core/class/new-class.ts';
import { classOf, settledTable } from './classes.ts';
import { publishedTable } from './published-facts.ts';

const said = (parts: readonly ClassSentencePart[]): string => parts.map(({ text }) => text).join('');
const CLASS = withTable(classOf([['Ada', '7']]), settledTable());

function taken(file: ClassFile, parts: readonly ClassSentencePart[]): void {
  for (const { choice, text } of parts) {
    if (choice === null) continue;
    const offers = classOffers(file, choice);
    if (choice === 'columns') {
      expect(offers).toBeNull();
      continue;
    }
    const chosen = offers?.filter((offer) => offer.chosen) ?? [];
    expect(chosen.map(({ label }) => label)).toEqual([text]);
    for (const { file: next, label } of offers ?? []) {
      const again = classOffers(next, choice)?.filter((offer) => offer.chosen) ?? [];
      expect(again.map((offer) => offer.label)).toEqual([label]);
    }
  }
}

describe('sentences of a class', () => {
  it('say every choice as its present offer is called, and every offer is taken', () => {
    taken(CLASS, reportSentence(CLASS));
    taken(CLASS, slipSentence(CLASS));
    const standing = withTable(CLASS, null);
    taken(standing, reportSentence(standing));
  });

  it('speak of no rank where there is no table, and of nobody in a summary', () => {
    const standing = said(reportSentence(withTable(CLASS, null)));
    expect(standing).toBe('The class standing is printed in English on A4. The pupils stand in the order of the list.');
    expect(classOffers(withTable(CLASS, null), 'sort')?.some(({ label }) => label.includes('rank'))).toBe(false);
    const summary = { ...CLASS, sharing: { ...CLASS.sharing, as: 'summary' as const } };
    expect(said(reportSentence(summary))).toBe('The summary is printed in English on A4; it names nobody.');
  });

  it('leave no order to be chosen where codes give it', () => {
    const coded = { ...CLASS, sharing: { ...CLASS.sharing, as: 'codes' as const } };
    expect(said(reportSentence(coded))).toContain('The pupils stand in the order of their codes');
    expect(reportSentence(coded).some(({ choice }) => choice === 'sort')).toBe(false);
  });

  it('write numbers and dates as the language does, and keep words of the user’s own', () => {
    const phrases = [{ key: 'slip.ask', text: 'Ask at the school.' }];
    const own = { ...CLASS, slips: { ...CLASS.slips, language: { ...CLASS.slips.language, phrases } } };
    const german = classOffers(own, 'slip-language')?.find(({ label }) => label === 'German')?.file.slips.language;
    expect(german).toMatchObject({ tag: 'de', words: 'de', numbers: { decimalMark: ',' }, phrases });
  });
});

describe('columns of a class report', () => {
  it('offer what the table has but the band, which is always printed', () => {
    const keys = columnsToTick(CLASS).map(({ key }) => key);
    expect(CLASS.table?.columns.map(({ key }) => key)).toContain('measurement-band');
    expect(keys).not.toContain('measurement-band');
    const [key = ''] = keys;
    const without = withColumn(CLASS, key, false);
    expect(without.report.columns).not.toContain(key);
    expect(withColumn(without, key, true).report.columns).toContain(key);
  });

  it('print the scores of another table at first, and nothing about how it was made', () => {
    const table = { ...settledTable(), columns: [], peopleNoun: 'candidates' as const };
    const counted = {
      ...table,
      columns: (['count', 'exact-rank', 't', 'stanine'] as const).map((key) => ({ key, name: key, heading: [key] })),
    };
    const file = withTable({ ...newClass('', 1), group: ['4'] }, counted);
    expect(file).toMatchObject({ group: null, people: 'candidates', report: { columns: ['t', 'stanine'] } });
    expect(
      withTable(file, publishedTable('Raw score\tPercentile rank\tStanine\n0\t10\t1\n1\t90\t9')).report.columns,
    ).toEqual(['column-1']);
    expect(withTable(file, null)).toMatchObject({ table: null, people: 'candidates', report: { columns: [] } });
  });
});
