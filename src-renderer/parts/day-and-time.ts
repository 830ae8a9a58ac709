/** "2026-06-15 09:41" by this machine's clock: for lists of files, never for print. */
export function dayAndTime(at: number): string {
  const time = new Date(at);
  return `${String(time.getFullYear())}-${two(time.getMonth() + 1)}-${two(time.getDate())} ${hourAndMinute(at)}`;
}

/** "09:41" */
export function hourAndMinute(at: number): string {
  const time = new Date(at);
  return `${two(time.getHours())}:${two(time.getMinutes())}`;
}

function two(value: number): string {
  return String(value).padStart(2, '0');
}
