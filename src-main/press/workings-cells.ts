import { computedText } from '../../shared-core/norms/adjustments.ts';
import type { ConversionRow } from '../../shared-core/norms/conversion-table.ts';
import { groupedClass } from '../../shared-core/norms/grouped-class.ts';
import { ratio, roundRatio } from '../../shared-core/percentile/exact-ratio.ts';
import { printRank } from '../../shared-core/scores/printed-number.ts';
import type { TablePlaces } from './table-layout.ts';
import { rankCell, typedCell } from './typed-cell.ts';
import { columnLetter, type WorkingsPlaces } from './workings-places.ts';
import { classOf, numeratorFormula } from './workings-numerator.ts';
import type { FactKey, WorkingsKey, WorkingsPlan } from './workings-plan.ts';

/** A value, or a formula with the result that the norm set gives it; formulas compute it anew. */
export type WorkingsCell =
  | { readonly kind: 'value'; readonly value: number | string }
  | { readonly kind: 'formula'; readonly formula: string; readonly result: number | string };

/** What stands where a row agrees with the printed table. */
export const SAME = 'same';

/** Everything that formulas are written from. */
export interface WorkingsBasis {
  readonly plan: WorkingsPlan;
  readonly places: WorkingsPlaces;
  readonly table: TablePlaces;
}

/** One cell of a column; `position` counts scores from the lowest, 0. Throws on a position beyond the table. */
export function workingsCell({ plan, places, table }: WorkingsBasis, key: WorkingsKey, position: number): WorkingsCell {
  const { norms, project, curve } = plan;
  const row = norms.rows[position];
  if (row === undefined) throw new RangeError(`no row ${position}`);
  const value = (of: number | string): WorkingsCell => ({ kind: 'value', value: of });
  const formula = (of: string, result: number | string): WorkingsCell => ({ kind: 'formula', formula: of, result });
  const cell = (of: WorkingsKey): string => places.cell(of, position);
  const [divisor, steps] = plan.route === 'values' ? ['', ''] : [places.fact('divisor'), places.fact('steps')];
  const exact = numeratorOf(plan, row);
  switch (key) {
    case 'score':
      return value(row.score);
    case 'count':
      return value(row.count);
    case 'weight':
      return value(plan.route === 'values' ? row.weight : Number(row.parts.at));
    case 'share':
      return value(curve?.probabilities[position] ?? NaN);
    case 'curve-low':
      return value(curve?.below[position] ?? NaN);
    case 'curve-middle':
      return value(curve?.middle[position] ?? NaN);
    case 'curve-high':
      return value(curve?.atOrBelow[position] ?? NaN);
    case 'below': {
      const poorer = plan.good ? position - 1 : position + 1;
      if (norms.rows[poorer] === undefined) return value(0);
      const result = curve === null ? Number(row.parts.below) : belowOnCurve(plan, position);
      return formula(places.cell('up-to', poorer), result);
    }
    case 'up-to': {
      const result = curve === null ? Number(row.parts.below + row.parts.at) : upToOnCurve(plan, position);
      return formula(`${cell('below')}+${cell(heaped(plan))}`, result);
    }
    case 'class-below':
      return formula(places.cell('below', classOf(plan, position).first), Number(inClassOf(plan, row).below));
    case 'in-class': {
      const { first, last } = classOf(plan, position);
      const span = places.span(heaped(plan), Math.min(first, last), Math.max(first, last));
      return formula(`SUM(${span})`, Number(inClassOf(plan, row).inClass));
    }
    case 'place':
      return value(classOf(plan, position).place);
    case 'numerator':
      return formula(numeratorFormula(plan, places, position), Number(exact));
    case 'rank':
      return plan.route === 'values'
        ? value(row.percentileRank)
        : formula(`${cell('numerator')}/(${divisor}*${steps})`, row.percentileRank);
    case 'rest':
      return formula(`MOD(${cell('numerator')},${divisor})`, Number(exact % plan.divisor));
    case 'whole':
      return formula(`(${cell('numerator')}-${cell('rest')})/${divisor}`, Number(exact / plan.divisor));
    case 'rounded': {
      const onHalf = project.table.rounding === 'half-up' ? '1' : `MOD(${cell('whole')},2)`;
      const up = `IF(2*${cell('rest')}>${divisor},1,IF(2*${cell('rest')}<${divisor},0,${onHalf}))`;
      const { decimals, rounding } = project.table;
      return formula(`${cell('whole')}+${up}`, Number(roundRatio(row.rank, decimals, rounding)));
    }
    case 'printed': {
      const result = typedCell(computedText(row)).value;
      return plan.route === 'values' ? value(result) : formula(printedFormula(plan, places, position), result);
    }
    case 'table':
      return formula(inTable(table, table.rankColumn, position), rankCell(row).value);
    case 'same': {
      const score = inTable(table, table.scoreColumn, position);
      const [ours, theirs] = [cell('printed'), cell('table')];
      const numbers = `IF(AND(ISNUMBER(${ours}),ISNUMBER(${theirs})),ROUND(${ours}-${theirs},1),"differs")`;
      const text = `IF(${cell('score')}<>${score},"other score",IF(${ours}=${theirs},"${SAME}",${numbers}))`;
      return formula(text, agreementOf(row));
    }
  }
}

/** "same" in every row that nobody adjusted by hand; there, how far the computed rank lies from the printed one. */
function agreementOf(row: ConversionRow): number | string {
  if (row.adjusted === null) return SAME;
  const [ours, theirs] = [typedCell(computedText(row)), rankCell(row)];
  if (ours.kind === 'text' || theirs.kind === 'text') return 'differs';
  return Math.round((ours.value - theirs.value) * 10) / 10;
}

/** A number of the whole group. */
export function factCell({ plan, places }: WorkingsBasis, key: FactKey): WorkingsCell {
  const { norms, offset, perClass, project } = plan;
  const last = norms.rows.length - 1;
  const number = (value: bigint | number | undefined): WorkingsCell => ({ kind: 'value', value: Number(value) });
  const formula = (of: string, result: bigint | number): WorkingsCell => ({
    kind: 'formula',
    formula: of,
    result: Number(result),
  });
  switch (key) {
    case 'people':
      return formula(`SUM(${places.span('count', 0, last)})`, norms.summary.n);
    case 'weight-sum':
      return formula(`SUM(${places.span('weight', 0, last)})`, norms.rows[0]?.parts.all ?? 0n);
    case 'offset-top':
      return number(offset?.numerator);
    case 'offset-bottom':
      return number(offset?.denominator);
    case 'class-size':
      return number(perClass ?? undefined);
    case 'divisor':
      return plan.curve === null ? formula(divisorFormula(plan, places), plan.divisor) : number(plan.divisor);
    case 'steps':
      return number(plan.steps);
    case 'highest':
      return formula(`100*${places.fact('steps')}-1`, 100 * 10 ** project.table.decimals - 1);
  }
}

function divisorFormula(plan: WorkingsPlan, places: WorkingsPlaces): string {
  const all = places.fact(plan.weighted ? 'weight-sum' : 'people');
  switch (plan.definition.kind) {
    case 'midpoint':
      return `2*${all}`;
    case 'at-or-below':
    case 'below':
      return all;
    case 'plotting-position': {
      const weights = plan.weighted ? `${all}*` : '';
      return `2*${weights}((${places.fact('people')}+1)*${places.fact('offset-bottom')}-2*${places.fact('offset-top')})`;
    }
    case 'grouped':
      return `2*${places.fact('class-size')}*${all}`;
  }
}

function printedFormula({ project, steps }: WorkingsPlan, places: WorkingsPlaces, position: number): string {
  const [numerator, rounded] = [places.cell('numerator', position), places.cell('rounded', position)];
  const [divisor, highest, perPoint] = [places.fact('divisor'), places.fact('highest'), places.fact('steps')];
  const inPoints = (of: string): string => (steps === 1 ? of : `${of}/${perPoint}`);
  if (project.table.ends === 'held') return inPoints(`MAX(1,MIN(${highest},${rounded}))`);
  const low = printRank(ratio(0n, 1n), project.table).text;
  const high = printRank(ratio(100n, 1n), project.table).text;
  const between = `IF(${numerator}>${highest}*${divisor},"${high}",${inPoints(rounded)})`;
  return `IF(${numerator}<${divisor},"${low}",${between})`;
}

/** The rank in printed steps times the divisor; 0 where ranks are values. */
function numeratorOf({ divisor, route, steps }: WorkingsPlan, { rank }: ConversionRow): bigint {
  if (route === 'values') return 0n;
  const product = rank.numerator * BigInt(steps) * divisor;
  if (product % rank.denominator !== 0n) throw new RangeError('the divisor does not carry the rank');
  return product / rank.denominator;
}

/** The column that cumulates. */
function heaped({ route, weighted }: WorkingsPlan): WorkingsKey {
  return route === 'shares' ? 'share' : weighted ? 'weight' : 'count';
}

function belowOnCurve({ curve, good }: WorkingsPlan, position: number): number {
  return (good ? curve?.below[position] : 1 - (curve?.atOrBelow[position] ?? NaN)) ?? NaN;
}

function upToOnCurve({ curve, good }: WorkingsPlan, position: number): number {
  return (good ? curve?.atOrBelow[position] : 1 - (curve?.below[position] ?? NaN)) ?? NaN;
}

function inClassOf({ norms, definition }: WorkingsPlan, row: ConversionRow): { below: bigint; inClass: bigint } {
  if (definition.kind !== 'grouped') throw new RangeError('no classes');
  return groupedClass(norms.group.table, row, definition.width);
}

function inTable({ sheetName, firstRow }: TablePlaces, column: number, position: number): string {
  return `'${sheetName}'!${columnLetter(column)}${firstRow + position}`;
}
