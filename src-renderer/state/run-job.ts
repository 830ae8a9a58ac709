import type { Desk, JobResult, Reply } from '../../shared-core/desk.ts';

const BETWEEN_LOOKS_MS = 120;

/**
 * Follows a job that the desk has started until it ends. Null when it was cancelled. Progress is 0–1.
 */
export async function followJob(
  desk: Desk,
  job: string,
  onProgress: (progress: number, doing: string) => void,
): Promise<Reply<JobResult | null>> {
  for (;;) {
    const state = await desk.ask('job-state', { job });
    if (!state.ok) return state;
    switch (state.value.state) {
      case 'running':
        onProgress(state.value.progress, state.value.doing);
        await new Promise((resolve) => setTimeout(resolve, BETWEEN_LOOKS_MS));
        break;
      case 'done':
        return { ok: true, value: state.value.result };
      case 'failed':
        return { ok: false, problem: state.value.problem };
      case 'cancelled':
        return { ok: true, value: null };
    }
  }
}
