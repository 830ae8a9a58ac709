import * as v from 'valibot';

const cut = v.pipe(
  v.object({
    /** "Reading support", as it is printed. */
    name: v.pipe(v.string(), v.maxLength(400)),
    /** Raw-score points: who has this score or a better one stands on its good side. */
    score: v.pipe(v.number(), v.finite()),
    /** Values of the one group that it holds for; null for all groups. */
    values: v.nullable(v.pipe(v.array(v.pipe(v.string(), v.maxLength(400))), v.readonly())),
  }),
  v.readonly(),
);

/** The cut scores of a project, in print order. */
export const cutsSchema = v.pipe(v.array(cut), v.maxLength(50), v.readonly());
