import { formatDuration } from '../number/time';

/** Time left from the share done so far; nothing is said before 5 %, when a guess would mislead. */
export function timeLeft(startedIso: string, progress01: number, nowMs = Date.now()): string | null {
  if (progress01 < 0.05 || progress01 >= 1) return null;
  const spentSeconds = (nowMs - Date.parse(startedIso)) / 1000;
  return `about ${formatDuration((spentSeconds / progress01) * (1 - progress01))} left`;
}
