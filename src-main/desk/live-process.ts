import { codeOf } from '../project-file/disk-trouble.ts';

/** Whether a process of that number runs on this machine, whoever owns it. */
export function isAlive(processId: number): boolean {
  if (!Number.isSafeInteger(processId) || processId <= 0) return false;
  try {
    process.kill(processId, 0);
    return true;
  } catch (error) {
    return codeOf(error) === 'EPERM';
  }
}
