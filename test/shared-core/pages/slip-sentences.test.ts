import { expect, it } from 'vitest';
import { ENGLISH_WORDS } from '../../../shared-core/languages/phrases.ts';
import { classResults } from '../../../shared-core/class/class-results.ts';
import type { ClassTable } from '../../../shared-core/class/class-table.ts';
import { slipSentences } from '../../../shared-core/pages/slip-sentences.ts';
import { slipTexts } from '../../../shared-core/pages/slip-texts.ts';
import { classOf, settledTable } from '../class/classes.ts';
import { publishedTable } from '../class/published-facts.ts';

/** Which listed sentences a change of their words would change on the slips of everybody together. */
function said(table: ClassTable): readonly string[] {
  const scores = table.groups.flatMap(({ rows }) => rows.map(({ low }) => String(low)));
  const file = classOf(
    scores.map((score, index) => [`Pupil ${index}`, score]),
    { table, group: table.groups[0]?.values ?? null },
  );
  const built = classResults(file);
  if (!built.ok) throw new Error(built.problem);
  const print = { file, codes: [], results: built.results };
  const textsWith = (key: string | null): string => {
    const phrases = key === null ? ENGLISH_WORDS.phrases : { ...ENGLISH_WORDS.phrases, [key]: 'Said in other words.' };
    return JSON.stringify(built.results.pupils.map((pupil) => slipTexts(print, { ...ENGLISH_WORDS, phrases }, pupil)));
  };
  const usual = textsWith(null);
  return slipSentences(table)
    .map(({ key }) => key)
    .filter((key) => textsWith(key) !== usual);
}

it('lists the sentences that stand on slips of the table, and no other', () => {
  const published = publishedTable('0 <1\n1 50\n2 >99');
  for (const table of [
    settledTable(),
    published,
    { ...published, scale: { ...published.scale, direction: 'low-is-good' as const } },
  ]) {
    const listed = slipSentences(table).map(({ key }) => key);
    expect(new Set(listed).size).toBe(listed.length);
    const ring = table.source === 'published' || said(table).includes('slip.picture-ring');
    expect(said(table)).toEqual(listed.filter((key) => ring || key !== 'slip.picture-ring'));
  }
  expect(slipSentences(published).map(({ key }) => key)).not.toContain('slip.band');
  expect(slipSentences(settledTable()).map(({ key }) => key)).not.toContain('slip.no-band');
});
