/** The two shapes of a reply, as they are written in the host. */
export function answered<T>(value: T): { readonly ok: true; readonly value: T } {
  return { ok: true, value };
}

/** A failure as a value: one or two sentences that tell what happened and what to do. */
export function refused(problem: string): { readonly ok: false; readonly problem: string } {
  return { ok: false, problem };
}
