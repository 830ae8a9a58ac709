import { countedPeople } from '../norms/norm-groups.ts';
import { dateInLanguage } from '../languages/number-format.ts';
import type { PupilResult } from '../class/class-results.ts';
import { figure, say, type PrintWords } from '../languages/phrases.ts';
import { printCount } from '../scores/printed-number.ts';
import { chartRow } from './class-pupils-table.ts';
import { labelOf, rankParts, type ClassPrint } from './class-print.ts';
import { asGiven, classFoot, tableTitle } from './class-report-texts.ts';
import { figureInWords, peopleWord } from './class-words.ts';
import { chartPlace, offScale, type ChartRow } from './band-chart-scale.ts';

/** What stands on the slip of one pupil. */
export interface SlipTexts {
  readonly name: string;
  readonly test: string;
  /** "DRAFT" where the table is one; empty otherwise. */
  readonly draft: string;
  readonly facts: readonly SlipFact[];
  readonly chart: ChartRow;
  readonly chartAlt: string;
  readonly caption: string;
  readonly means: SlipPassage;
  readonly meansNot: SlipPassage;
  readonly foot: string;
}

/** A figure with its label, as the table prints it. */
export interface SlipFact {
  readonly label: string;
  readonly text: string;
  readonly said: string | null;
}

export interface SlipPassage {
  readonly head: string;
  readonly paragraphs: readonly string[];
}

/** A description of the norm group longer than this stands in the report alone. */
const LONGEST_POPULATION = 160;

/** The sentences of a slip, chosen by the numbers of the pupil. */
export function slipTexts(print: ClassPrint, words: PrintWords, pupil: PupilResult): SlipTexts {
  const { file, results } = print;
  const { table } = results;
  const { found } = pupil;
  const name = labelOf(print, pupil);
  const test = tableTitle(table);
  const rank = figureInWords(words, found.printed);
  const band = found.band === null ? null : figureInWords(words, found.band.text);
  return {
    name,
    test: file.date === '' ? test : say(words, 'slip.test', { test, date: dateInLanguage(file.date, words.numbers) }),
    draft: table.draft ? say(words, 'head.draft') : '',
    facts: slipFacts(pupil, words),
    chart: chartRow(pupil),
    chartAlt:
      band === null ? say(words, 'slip.picture-alt', { rank }) : say(words, 'slip.picture-alt-band', { rank, band }),
    caption: captionOf(chartRow(pupil), words),
    means: {
      head: say(words, 'slip.means'),
      paragraphs: [
        scoreSentences(print, words, pupil, name).join(' '),
        rankSentences(print, words, pupil).join(' '),
        bandSentence(print, words, name, band),
      ],
    },
    meansNot: {
      head: say(words, 'slip.means-not'),
      paragraphs: [
        say(words, 'slip.not-per-cent'),
        say(words, 'slip.not-judgement', { name }),
        say(words, 'slip.not-alone'),
        say(words, 'slip.ask'),
      ],
    },
    foot: classFoot(table, words, results.check),
  };
}

/** What the picture shows: a dot or a ring for the rank, and the bar where some of it lies on the scale. */
function captionOf({ rank, band }: ChartRow, words: PrintWords): string {
  const beyond =
    band !== null && offScale(band.low) && offScale(band.high) && chartPlace(band.low) === chartPlace(band.high);
  return [
    say(words, offScale(rank) ? 'slip.picture-ring' : 'slip.picture-dot'),
    ...(band === null || beyond ? [] : [say(words, 'slip.picture-bar')]),
    say(words, 'slip.picture-scale'),
  ].join(' ');
}

function slipFacts({ found, scoreText }: PupilResult, words: PrintWords): readonly SlipFact[] {
  const fact = (label: string, printed: string): SlipFact => {
    const text = figure(words, printed);
    const said = figureInWords(words, printed);
    return { label, text, said: said === text ? null : said };
  };
  return [
    fact(say(words, 'slip.score-label'), scoreText),
    fact(say(words, 'slip.rank-label'), found.printed),
    ...(found.band === null ? [] : [fact(say(words, 'slip.band-label'), found.band.text)]),
  ];
}

function scoreSentences(
  { results }: ClassPrint,
  words: PrintWords,
  pupil: PupilResult,
  name: string,
): readonly string[] {
  const { table } = results;
  const { rows } = pupil.table;
  const ends = [rows[0], rows.at(-1)].map((row) => row?.scoreText ?? '');
  const [lowest = '', highest = ''] = ends.map((text, index) => {
    const sides = text.split('\u2013');
    return figure(words, (index === 0 ? sides[0] : sides.at(-1)) ?? '');
  });
  const score = figure(words, pupil.scoreText);
  return [
    say(words, 'slip.score', { name, score, lowest, highest }),
    ...(table.scale.direction === 'low-is-good' ? [say(words, 'slip.low-is-good')] : []),
  ];
}

function rankSentences({ results }: ClassPrint, words: PrintWords, pupil: PupilResult): readonly string[] {
  const { table } = results;
  const { title, n, population } = pupil.table;
  const people = peopleWord(words, table.peopleNoun);
  const count = n === null ? null : countedPeople(printCount(n), table.peopleNoun, words);
  const group = count === null ? title : say(words, 'class.group-and-count', { group: title, count });
  const said = population.trim();
  const { end, figures, adjusted } = rankParts(pupil.found.printed);
  const share = say(words, `slip.share-${end ?? 'about'}`, { rank: figure(words, figures) });
  const worse = say(words, table.scale.direction === 'high-is-good' ? 'class.lower' : 'class.higher');
  return [
    say(words, 'slip.group', { people, group }),
    ...(said === '' || said.length > LONGEST_POPULATION
      ? []
      : [say(words, 'slip.population', { population: said.replace(/\.$/, '') })]),
    say(words, `slip.rank-${table.definitionKind}`, { share, worse }),
    ...(adjusted ? [say(words, 'slip.adjusted')] : []),
  ];
}

/** What the band means: it holds the average over many such tests, the true score of the theory, at its level. */
function bandSentence({ results, file }: ClassPrint, words: PrintWords, name: string, band: string | null): string {
  const { level } = results.table;
  if (band === null || level === null) return say(words, 'slip.no-band', { name });
  return say(words, 'slip.band', {
    name,
    band,
    level: asGiven(words, level),
    people: peopleWord(words, file.people),
  });
}
