import * as v from 'valibot';

function told(most: number, message: string) {
  return v.pipe(
    v.string(),
    v.check((text) => text.trim() !== '', message),
    v.maxLength(most),
  );
}

/** A printed rank that somebody changed by hand. */
const adjustment = v.pipe(
  v.object({
    /** Values of the group's grouping columns. */
    values: v.pipe(v.array(v.pipe(v.string(), v.maxLength(400))), v.readonly()),
    /** Raw-score points. */
    score: v.pipe(v.number(), v.finite()),
    /** The text that prints instead of the computed rank. */
    to: told(10, 'an adjustment names the rank to print'),
    reason: told(400, 'an adjustment needs a reason'),
    by: told(100, 'an adjustment tells who made it'),
  }),
  v.readonly(),
);

export const adjustmentsSchema = v.pipe(v.array(adjustment), v.readonly());
export type Adjustment = v.InferOutput<typeof adjustment>;
