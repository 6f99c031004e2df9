import type { DeskView } from '@siltlight/common/wire/desk';
import { deskHeadline } from './headline';

const now = Date.parse('2026-01-10T00:00:00Z');
const empty: DeskView = {
  queue: [],
  mySubmissions: [],
  awaitingSignOff: [],
  stale: [],
  latestPublished: [],
  lately: [],
};
const queued = (waitsSince: string, own: boolean) => ({ waitsSince, own }) as DeskView['queue'][number];

test('the title counts what this steward may decide, and the longest wait', () => {
  const queue = [
    queued('2026-01-01T00:00:00Z', false),
    queued('2026-01-09T00:00:00Z', false),
    queued('2025-12-01T00:00:00Z', true),
  ];
  expect(deskHeadline({ ...empty, queue }, now)).toBe('Two submissions wait, the oldest for 9 days');
});

test('own submissions in the queue do not count as waiting for oneself', () => {
  expect(deskHeadline({ ...empty, queue: [queued('2026-01-01T00:00:00Z', true)] }, now)).toBe(
    'Nothing waits for you',
  );
});

test('a single thing is told in the singular', () => {
  const awaitingSignOff = [{}] as DeskView['awaitingSignOff'];
  expect(deskHeadline({ ...empty, awaitingSignOff }, now)).toBe('One estimate waits for a second person');
});
