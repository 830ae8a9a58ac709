import type { LeftOut } from '../norms/norm-project.ts';
import { LEFT_OUT_RULES, MAX_ROWS_LISTED, type LeftOutRule } from '../norms/reading.ts';

/** How the rows of a file became the rows of a cohort: rowsRead = rowsKept + the counts of `leftOut`. */
export interface RowFlow {
  readonly rowsRead: number;
  readonly rowsKept: number;
  /** Rules that left out at least one row, in the order of LEFT_OUT_RULES. */
  readonly leftOut: readonly LeftOut[];
}

/** Keeps the exclusion flow while rows go by. */
export class FlowRecorder {
  private kept = 0;
  private readonly counts = new Map<LeftOutRule, number>();
  private readonly rows = new Map<LeftOutRule, number[]>();

  keep(): void {
    this.kept += 1;
  }

  leaveOut(rule: LeftOutRule, row: number): void {
    this.counts.set(rule, (this.counts.get(rule) ?? 0) + 1);
    const listed = this.rows.get(rule);
    if (listed === undefined) this.rows.set(rule, [row]);
    else if (listed.length < MAX_ROWS_LISTED) listed.push(row);
  }

  flow(): RowFlow {
    const leftOut = LEFT_OUT_RULES.flatMap((rule) => {
      const count = this.counts.get(rule) ?? 0;
      return count === 0 ? [] : [{ rule, count, rows: this.rows.get(rule) ?? [] }];
    });
    const rowsRead = this.kept + leftOut.reduce((sum, { count }) => sum + count, 0);
    return { rowsRead, rowsKept: this.kept, leftOut };
  }
}
