import type { ChartConfiguration, ChartDataset, Point } from 'chart.js';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import { printNumber } from '../../shared-core/scores/printed-number.ts';
import type { ChartInks } from './chart-inks.ts';

const FONT = { family: "'Source Sans 3', sans-serif", size: 12 };

/** Cumulative per cent at and below each score (from the poor end), 0–100. */
function cumulativePercents({ rows }: GroupNorms): readonly number[] {
  return rows.map((row) => (100 * row.cumulative) / row.provenance.percentileRank.all);
}

/** Observed steps and the percentile rank of each score, which the midpoint definition puts half way up its step. */
export function curveChart(norms: GroupNorms, inks: ChartInks): ChartConfiguration<'line', Point[]> {
  const { scale } = norms.group.table;
  const percents = cumulativePercents(norms);
  const rising = scale.direction === 'high-is-good';
  const steps = norms.rows.map((row, position) => ({ x: row.score, y: percents[position] ?? 0 }));
  const half = scale.step / 2;
  const line = rising
    ? [{ x: scale.min - half, y: 0 }, ...steps, { x: scale.max + half, y: 100 }]
    : [{ x: scale.min - half, y: 100 }, ...steps, { x: scale.max + half, y: 0 }];
  const ecdf: ChartDataset<'line', Point[]> = {
    label: 'Cumulative per cent, observed steps',
    data: line,
    // Each score's riser stands on the score itself: the curve holds its height up to the next score.
    stepped: rising ? 'before' : 'after',
    borderColor: inks.ink,
    borderWidth: 1.2,
    pointRadius: 0,
    pointHitRadius: 0,
  };
  const ranks: ChartDataset<'line', Point[]> = {
    label: 'Percentile rank of each score',
    data: norms.rows.map((row) => ({ x: row.score, y: row.percentileRank })),
    showLine: false,
    pointRadius: norms.rows.length > 80 ? 1.6 : 2.6,
    // A score that nobody obtained is hollow.
    pointBackgroundColor: norms.rows.map((row) => (row.count > 0 ? inks.curve : inks.paper)),
    pointBorderColor: inks.curve,
    pointHitRadius: 8,
  };
  return {
    type: 'line',
    data: { datasets: [ecdf, ranks] },
    options: {
      animation: false,
      responsive: true,
      maintainAspectRatio: false,
      layout: { autoPadding: false, padding: { right: 8, top: 4 } },
      interaction: { mode: 'nearest', axis: 'x', intersect: false },
      plugins: {
        tooltip: {
          filter: (item) => item.datasetIndex === 1,
          displayColors: false,
          callbacks: {
            title: () => '',
            label: (item) => {
              const row = norms.rows[item.dataIndex];
              if (row === undefined) return '';
              return `Raw ${row.scoreText}: rank ${printNumber(row.percentileRank, 2)}, printed ${row.printed}`;
            },
          },
          titleFont: FONT,
          bodyFont: FONT,
          backgroundColor: inks.ink,
          bodyColor: inks.paper,
        },
      },
      scales: {
        x: scoreAxis(norms, inks),
        y: {
          min: 0,
          max: 100,
          border: { display: false },
          grid: { color: inks.rule, drawTicks: false },
          ticks: { stepSize: 25, color: inks.soft, font: FONT, padding: 6 },
          afterFit: alignLeft,
        },
      },
    },
  };
}

/** How many people, or how much weight, stand at each score. */
export function frequencyChart(norms: GroupNorms, inks: ChartInks): ChartConfiguration<'bar', Point[]> {
  return {
    type: 'bar',
    data: {
      datasets: [
        {
          label: 'Frequency',
          data: norms.rows.map((row) => ({ x: row.score, y: row.weight })),
          backgroundColor: inks.curve,
          barPercentage: 1,
          categoryPercentage: norms.rows.length > 80 ? 0.9 : 0.6,
        },
      ],
    },
    options: {
      animation: false,
      responsive: true,
      maintainAspectRatio: false,
      layout: { autoPadding: false, padding: { right: 8, top: 4 } },
      parsing: false,
      normalized: true,
      plugins: { tooltip: { enabled: false } },
      scales: {
        x: { ...scoreAxis(norms, inks), offset: false },
        y: {
          beginAtZero: true,
          border: { display: false },
          grid: { color: inks.rule, drawTicks: false },
          ticks: { maxTicksLimit: 3, color: inks.soft, font: FONT, padding: 6, precision: 0 },
          afterFit: alignLeft,
        },
      },
    },
  };
}

/** Room for the figures at the left, in CSS pixels, so that one score stands at one place in every picture. */
const LEFT_ROOM = 40;

function alignLeft(axis: { width: number }): void {
  axis.width = LEFT_ROOM;
}

function scoreAxis(norms: GroupNorms, inks: ChartInks) {
  const { scale } = norms.group.table;
  return {
    type: 'linear' as const,
    min: scale.min - scale.step / 2,
    max: scale.max + scale.step / 2,
    border: { display: false },
    grid: { display: false },
    afterBuildTicks: (axis: { ticks: { value: number }[] }) => {
      axis.ticks = scoreTicks(scale.min, scale.max).map((value) => ({ value }));
    },
    ticks: { color: inks.soft, font: FONT, autoSkip: false, maxRotation: 0 },
  };
}

/** Round scores to label, at most about ten. */
export function scoreTicks(min: number, max: number): readonly number[] {
  const sizes = [0.5, 1, 2, 5, 10, 20, 25, 50, 100, 200, 250, 500, 1000];
  const size = sizes.find((candidate) => (max - min) / candidate <= 10) ?? (max - min) / 10;
  const first = Math.ceil(min / size) * size;
  return Array.from({ length: Math.floor((max - first) / size) + 1 }, (_, index) => first + index * size);
}
