import { countedPeople } from '../norms/norm-groups.ts';
import { dateInLanguage } from '../languages/number-format.ts';
import type { ClassResults } from '../class/class-results.ts';
import type { ClassTable, ClassTableGroup } from '../class/class-table.ts';
import { figure, say, type PrintWords } from '../languages/phrases.ts';
import { ADJUSTED_MARK } from '../norms/adjustment-words.ts';
import { decimalOf } from '../scale/decimal.ts';
import { printCount, printNumber } from '../scores/printed-number.ts';
import { inPrintOrder, labelOf, type ClassPrint, type Listed, type PrintedClass } from './class-print.ts';
import { inSentence } from '../languages/sentence.ts';
import { peopleWord } from './class-words.ts';
import { hasBands } from './class-pupils-table.ts';
import type { Paragraph } from './paragraph.ts';

/** What the report is about: the class as it is called. */
export function classTitle({ file }: PrintedClass, words: PrintWords): string {
  return file.title.trim() || say(words, 'class.report');
}

/** "Ostrey Vale reading survey (invented) · Form A". */
export function tableTitle({ title, form }: ClassTable): string {
  return [title.trim(), form.trim()].filter((part) => part !== '').join(' · ');
}

/** Under the title: what it is about, and the day of testing. */
export function classSubtitle({ file }: PrintedClass, about: string, words: PrintWords): string {
  const tested =
    file.date === '' ? [] : [say(words, 'class.tested-on', { date: dateInLanguage(file.date, words.numbers) })];
  return [about, ...tested].filter((part) => part !== '').join(', ');
}

/** Left side of the foot: which table this is, and which report. */
export function classFoot(table: ClassTable, words: PrintWords, check: string): string {
  const { edition, date, check: tableCheck } = table;
  return [
    ...(edition.trim() === '' ? [] : [say(words, 'foot.edition', { edition: edition.trim() })]),
    ...(date === '' ? [] : [dateInLanguage(date, words.numbers)]),
    ...(tableCheck === '' ? [] : [say(words, 'class.table-check', { check: tableCheck })]),
    say(words, 'class.report-check', { check }),
  ].join(' · ');
}

/** The groups whose tables the pupils were looked up in, in the order of the table. */
function groupsUsed({ results }: ClassPrint): readonly ClassTableGroup[] {
  return results.table.groups.filter((group) => results.pupils.some(({ table }) => table === group));
}

/** Which table it is, and what its ranks count. */
export function tableParagraphs(print: ClassPrint, words: PrintWords): readonly Paragraph[] {
  const { results, file } = print;
  const { table } = results;
  const used = groupsUsed(print);
  // Of a summary, a table that few were looked up in could tell who they are.
  const groups = file.sharing.as === 'summary' && used.length > 1 ? [] : used;
  const names = groups.map(({ title, n }) =>
    n === null
      ? title
      : say(words, 'class.group-and-count', {
          group: title,
          count: countedPeople(printCount(n), table.peopleNoun, words),
        }),
  );
  const populations = new Set(groups.map(({ population }) => population.trim()).filter((text) => text !== ''));
  const title = tableTitle(table);
  const what = [
    closed([title, names.join(', ')].filter((part) => part !== '').join('; ')),
    ...[...populations].map(closed),
    ...releaseSentences(table, words),
  ];
  const direction = table.scale.direction === 'low-is-good' ? [say(words, 'class.low-is-good')] : [];
  const rank = say(words, `class.rank-${table.definitionKind}`, {
    people: peopleWord(words, table.peopleNoun),
    'the-group': theGroup(table, words),
    worse: say(words, table.scale.direction === 'high-is-good' ? 'class.lower' : 'class.higher'),
  });
  return [
    { lead: say(words, 'class.table-lead'), text: what.join(' ') },
    { lead: say(words, 'class.rank-lead'), text: [rank, ...direction].join(' ') },
    ...(file.sharing.as === 'summary' ? [] : [bandParagraph(print, words)]),
  ];
}

function releaseSentences(table: ClassTable, words: PrintWords): readonly string[] {
  const { edition, date, check, cited, source } = table;
  if (source === 'published') {
    return cited.trim() === '' ? [] : [closed(say(words, 'class.table-cited', { source: unclosed(cited.trim()) }))];
  }
  const facts = [
    ...(edition.trim() === '' ? [] : [say(words, 'foot.edition', { edition: edition.trim() })]),
    ...(date === '' ? [] : [dateInLanguage(date, words.numbers)]),
    ...(check === '' ? [] : [say(words, 'foot.check', { check })]),
  ];
  return facts.length === 0 ? [] : [closed(facts.join(', '))];
}

/** "the norm group", or "the sample" of a table whose group is not described in full. */
export function theGroup({ groupNoun }: ClassTable, words: PrintWords): string {
  return say(words, groupNoun === 'norm group' ? 'class.the-norm-group' : 'class.the-sample');
}

/** What the band is, or that there is none and why. */
function bandParagraph(print: ClassPrint, words: PrintWords): Paragraph {
  const { reliability, level, peopleNoun } = print.results.table;
  const lead = say(words, 'class.band-lead');
  if (reliability === null || level === null) return { lead, text: say(words, 'class.band-missing') };
  const text = say(words, 'class.band-text', {
    level: asGiven(words, level),
    reliability: asGiven(words, reliability),
    people: peopleWord(words, peopleNoun),
  });
  return { lead, text };
}

/** A number with the decimals that it was given with. */
export function asGiven(words: PrintWords, value: number): string {
  return figure(words, printNumber(value, decimalOf(value).decimals));
}

/** Below the pupils' table: what the chart shows, and which ranks were set by hand. */
export function tableNotes(print: ClassPrint, words: PrintWords, hasChart: boolean): readonly string[] {
  const { pupils } = print.results;
  const marked = new Set(
    pupils.filter(({ found }) => found.printed.endsWith(ADJUSTED_MARK)).map(({ table }) => table.note),
  );
  return [
    ...(hasChart ? [say(words, hasBands(print) ? 'class.chart-caption-band' : 'class.chart-caption')] : []),
    ...[...marked].filter((note) => note !== ''),
  ];
}

/** What became of those of a list who have no result, and which scores were entered anew. */
type ListOutcome = Pick<ClassResults, 'missed' | 'leftOut' | 'open'> & {
  readonly pupils: readonly (Listed & { readonly corrected: boolean })[];
};

/** Everybody of the list who is not in the table, by name or code, with the reason; and whose score was entered anew. */
export function missedParagraphs(
  print: PrintedClass,
  { missed, leftOut, open, pupils }: ListOutcome,
  words: PrintWords,
): readonly Paragraph[] {
  const named = (listed: readonly Listed[]): readonly string[] =>
    inPrintOrder(print, listed).map((one) => labelOf(print, one));
  const withWhy = (aside: ListOutcome['open'], standing: string): readonly string[] =>
    inPrintOrder(print, aside).map((one) =>
      say(words, 'class.name-and-why', {
        name: labelOf(print, one),
        // What was asked about a row may hold names of others, and is asked in English.
        why:
          print.file.sharing.as === 'codes' || words.words !== 'en' ? standing : inSentence(words, unclosed(one.why)),
      }),
    );
  const lists = [
    ['class.absent', named(missed.filter(({ status }) => status === 'absent'))],
    ['class.not-tested', named(missed.filter(({ status }) => status === 'not-tested'))],
    ['class.excused', named(missed.filter(({ status }) => status === 'excused'))],
    ['class.left-out', withWhy(leftOut, say(words, 'class.left-out-code'))],
    ['class.open', withWhy(open, say(words, 'class.open-code'))],
    ['class.corrected', named(pupils.filter(({ corrected }) => corrected))],
  ] as const;
  return lists
    .filter(([, names]) => names.length > 0)
    .map(([key, names]) => ({
      lead: say(words, key, { count: figure(words, printCount(names.length)) }),
      text: closed(names.join('; ')),
    }));
}

/** How to read the report, what not to do with it, and who may see it. */
export function readingParagraphs(print: ClassPrint, words: PrintWords): readonly Paragraph[] {
  const { results, file } = print;
  const people = peopleWord(words, file.people);
  const group = { 'the-group': theGroup(results.table, words) };
  const reading = hasBands(print)
    ? say(words, 'class.read', { ...group, people })
    : say(words, 'class.read-no-band', group);
  return [
    ...(file.sharing.as === 'summary' ? [] : [{ lead: say(words, 'class.read-lead'), text: reading }]),
    { lead: say(words, 'class.no-mean-lead'), text: say(words, 'class.no-mean', { people }) },
    { lead: say(words, 'class.cautions-lead'), text: say(words, 'class.cautions') },
    ...keptParagraph(print, words),
  ];
}

/** Who may see the report; nothing of a summary, which names nobody. */
export function keptParagraph({ file }: PrintedClass, words: PrintWords): readonly Paragraph[] {
  const lead = say(words, 'class.private-lead');
  switch (file.sharing.as) {
    case 'names':
      return [{ lead, text: say(words, 'class.private-names') }];
    case 'codes':
      return [{ lead, text: say(words, 'class.private-codes') }];
    case 'summary':
      return [];
  }
}

/** A sentence with its end. */
function closed(sentence: string): string {
  return /[.!?…]$/.test(sentence) ? sentence : `${sentence}.`;
}

/** The same without it, to stand inside another. */
function unclosed(sentence: string): string {
  return sentence.replace(/\.$/, '');
}
