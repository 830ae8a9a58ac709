import * as v from 'valibot';

const wholeNumber = v.pipe(v.number(), v.safeInteger(), v.minValue(0));
const wholeNumbers = v.pipe(v.array(wholeNumber), v.readonly());
const unitTexts = v.pipe(v.array(v.pipe(v.string(), v.regex(/^\d{1,200}$/))), v.readonly());

/** The people of one cell of a tally by cluster; `clustersFit` says whether they are the people of the cell. */
export const cellClustersSchema = v.pipe(
  v.object({
    parts: v.pipe(
      v.array(
        v.pipe(
          v.object({
            cluster: wholeNumber,
            positions: wholeNumbers,
            counts: wholeNumbers,
            weights: v.nullable(unitTexts),
          }),
          v.readonly(),
        ),
      ),
      v.readonly(),
    ),
    alone: wholeNumbers,
    aloneSquares: v.nullable(unitTexts),
  }),
  v.readonly(),
);

type CellClusters = v.InferOutput<typeof cellClustersSchema>;

interface CellSums {
  readonly counts: readonly number[];
  readonly weights: readonly string[] | null;
  readonly squares: readonly string[] | null;
  readonly clusters: CellClusters | null;
}

/** True where the clusters hold the people of their cell: the same counts at every score, and weights to match. */
export function clustersFit({ counts, weights, squares, clusters }: CellSums): boolean {
  if (clusters === null) return true;
  const { parts, alone, aloneSquares } = clusters;
  if (alone.length !== counts.length || (squares === null) !== (aloneSquares === null)) return false;
  if (aloneSquares !== null && aloneSquares.length !== counts.length) return false;
  const left = counts.map((count, position) => count - (alone[position] ?? 0));
  const weightLeft = weights?.map(BigInt) ?? null;
  let before = -1;
  for (const part of parts) {
    if (part.cluster <= before || (part.weights === null) !== (weights === null)) return false;
    before = part.cluster;
    const { length } = part.positions;
    if (length === 0 || part.counts.length !== length || (part.weights?.length ?? length) !== length) return false;
    if (!part.positions.every((position, index) => position > (part.positions[index - 1] ?? -1))) return false;
    if (!part.counts.every((count) => count > 0)) return false;
    part.positions.forEach((position, index) => {
      left[position] = (left[position] ?? 0) - (part.counts[index] ?? 0);
      if (weightLeft !== null) weightLeft[position] = (weightLeft[position] ?? 0n) - BigInt(part.weights?.[index] ?? 0);
    });
  }
  return (
    left.length === counts.length &&
    left.every((people) => people === 0) &&
    (weightLeft === null || weightLeft.every((weight, position) => aloneFits(weight, position, clusters, squares)))
  );
}

/** The weight that no named cluster has is that of the people alone at the score, and their squares go with it. */
function aloneFits(
  weight: bigint,
  position: number,
  { alone, aloneSquares }: CellClusters,
  squares: readonly string[] | null,
): boolean {
  const people = BigInt(alone[position] ?? 0);
  const sum = BigInt(aloneSquares?.[position] ?? '0');
  if (people === 0n) return weight === 0n && sum === 0n;
  return (
    weight > 0n && sum <= BigInt(squares?.[position] ?? '0') && sum <= weight ** 2n && sum * people >= weight ** 2n
  );
}
