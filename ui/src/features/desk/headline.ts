import type { DeskView } from '@siltlight/common/wire/desk';
import { formatWaits } from '../../shared/number/time';

const words = [
  'No',
  'One',
  'Two',
  'Three',
  'Four',
  'Five',
  'Six',
  'Seven',
  'Eight',
  'Nine',
  'Ten',
  'Eleven',
  'Twelve',
];
const inWords = (count: number) => words[count] ?? String(count);

const waits = (count: number, one: string, many: string) =>
  `${inWords(count)} ${count === 1 ? `${one} waits` : `${many} wait`}`;

/** The title of the desk is a sentence that says what waits, the most urgent first. */
export function deskHeadline(desk: DeskView, nowMs = Date.now()): string {
  const decidable = desk.queue.filter((submission) => !submission.own);
  if (decidable.length > 0) {
    const oldest = decidable.map((submission) => submission.waitsSince).sort()[0]!;
    return `${waits(decidable.length, 'submission', 'submissions')}, the oldest for ${formatWaits(oldest, nowMs)}`;
  }
  if (desk.awaitingSignOff.length > 0)
    return `${waits(desk.awaitingSignOff.length, 'estimate', 'estimates')} for a second person`;
  const returned = desk.mySubmissions.filter((submission) => submission.state === 'returned').length;
  if (returned > 0) return `${inWords(returned)} of your submissions came back with questions`;
  const drafts = desk.mySubmissions.filter((submission) => submission.state === 'draft').length;
  if (drafts > 0) return `${inWords(drafts)} of your drafts ${drafts === 1 ? 'is' : 'are'} not sent yet`;
  if (desk.stale.length > 0) return `${waits(desk.stale.length, 'estimate', 'estimates')} to be run again`;
  return 'Nothing waits for you';
}
