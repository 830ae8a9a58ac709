import type { ChartConfiguration, ChartDataset, Point, TooltipItem } from 'chart.js';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { PercentInterval } from '../../shared-core/precision/percent-interval.ts';
import { printNumber } from '../../shared-core/scores/printed-number.ts';
import type { ChartInks } from './chart-inks.ts';

const FONT = { family: "'Source Sans 3', sans-serif", size: 12 };

/** Cumulative per cent at and below each score (from the poor end), 0–100. */
function cumulativePercents({ rows }: GroupNorms): readonly number[] {
  return rows.map((row) => (100 * row.cumulative) / row.provenance.percentileRank.all);
}

/** A band about the ranks, one interval for each score, and how it is named. */
export interface ShownBand {
  readonly intervals: readonly PercentInterval[];
}

/**
 * Observed steps; the percentile rank of each score, which the midpoint definition puts half way up its step, or the
 * smooth curve; and a band about them.
 */
export function curveChart(
  norms: GroupNorms,
  band: ShownBand | null,
  inks: ChartInks,
): ChartConfiguration<'line', Point[]> {
  const smooth = norms.smoothing.state === 'smoothed';
  const ranks: ChartDataset<'line', Point[]> = {
    label: smooth ? 'Smoothed percentile rank of each score' : 'Percentile rank of each score',
    data: norms.rows.map((row) => ({ x: row.score, y: row.percentileRank })),
    showLine: smooth,
    borderColor: inks.curve,
    borderWidth: 2,
    pointRadius: smooth ? 0 : norms.rows.length > 80 ? 1.6 : 2.6,
    // A score that nobody obtained is hollow.
    pointBackgroundColor: norms.rows.map((row) => (row.count > 0 ? inks.curve : inks.paper)),
    pointBorderColor: inks.curve,
    pointHitRadius: 8,
  };
  return {
    type: 'line',
    data: { datasets: [ranks, observedSteps(norms, inks), ...bandEdges(norms, band, inks)] },
    options: {
      animation: false,
      responsive: true,
      maintainAspectRatio: false,
      layout: { autoPadding: false, padding: { right: 8, top: 4 } },
      interaction: { mode: 'nearest', axis: 'x', intersect: false },
      plugins: { tooltip: rankTooltip(norms, inks) },
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

function observedSteps(norms: GroupNorms, inks: ChartInks): ChartDataset<'line', Point[]> {
  const { scale } = norms.group.table;
  const percents = cumulativePercents(norms);
  const rising = scale.direction === 'high-is-good';
  const steps = norms.rows.map((row, position) => ({ x: row.score, y: percents[position] ?? 0 }));
  const half = scale.step / 2;
  const [first, last] = rising ? [0, 100] : [100, 0];
  return {
    label: 'Cumulative per cent, observed steps',
    data: [{ x: scale.min - half, y: first }, ...steps, { x: scale.max + half, y: last }],
    // Each score's riser stands on the score itself: the curve holds its height up to the next score.
    stepped: rising ? 'before' : 'after',
    borderColor: inks.ink,
    borderWidth: 1.2,
    pointRadius: 0,
    pointHitRadius: 0,
  };
}

/** The lower edge and, filled down to it, the upper one. */
function bandEdges(
  norms: GroupNorms,
  band: ShownBand | null,
  inks: ChartInks,
): readonly ChartDataset<'line', Point[]>[] {
  if (band === null) return [];
  const edge = (end: 'low' | 'high'): ChartDataset<'line', Point[]> => ({
    label: end === 'low' ? 'Lower end of the band' : 'Upper end of the band',
    data: norms.rows.map((row, position) => ({
      x: row.score,
      y: band.intervals[position]?.[end] ?? row.percentileRank,
    })),
    borderWidth: 0,
    pointRadius: 0,
    pointHitRadius: 0,
    ...(end === 'high' ? { fill: '-1', backgroundColor: `${inks.curve}38` } : {}),
  });
  return [edge('low'), edge('high')];
}

function rankTooltip(norms: GroupNorms, inks: ChartInks) {
  return {
    filter: (item: TooltipItem<'line'>) => item.datasetIndex === 0,
    displayColors: false,
    callbacks: {
      title: () => '',
      label: (item: TooltipItem<'line'>) => {
        const row = norms.rows[item.dataIndex];
        if (row === undefined) return '';
        const observed = row.smoothed === null ? '' : `, observed ${printNumber(row.observed.percentileRank, 2)}`;
        return `Raw ${row.scoreText}: rank ${printNumber(row.percentileRank, 2)}${observed}, printed ${row.printed}`;
      },
    },
    titleFont: FONT,
    bodyFont: FONT,
    backgroundColor: inks.ink,
    bodyColor: inks.paper,
  };
}

/** Freeman–Tukey residuals of a smoothed group, one bar for each score; between −2 and 2 is what chance gives. */
export function residualChart(
  norms: GroupNorms,
  residuals: readonly number[],
  inks: ChartInks,
): ChartConfiguration<'bar', Point[]> {
  const reach = Math.max(2.5, ...residuals.map(Math.abs));
  return {
    type: 'bar',
    data: {
      datasets: [
        {
          label: 'Freeman–Tukey residual',
          data: norms.rows.map((row, position) => ({ x: row.score, y: residuals[position] ?? 0 })),
          backgroundColor: inks.curve,
          barPercentage: 1,
          categoryPercentage: 0.35,
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
        x: { ...scoreAxis(norms, inks), offset: false, ticks: { display: false } },
        y: {
          min: -reach,
          max: reach,
          border: { display: false },
          grid: { color: inks.rule, drawTicks: false },
          afterBuildTicks: (axis: { ticks: { value: number }[] }) => {
            axis.ticks = [-2, 0, 2].map((value) => ({ value }));
          },
          ticks: { color: inks.soft, font: FONT, padding: 6, callback: (value) => printNumber(Number(value), 0) },
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
