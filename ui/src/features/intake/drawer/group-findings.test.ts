import type { FindingView } from '@siltlight/common/wire/submissions';
import { cellMarks } from '../grid/marks';
import { countBySeverity, groupFindings, shownSeverities, stepFinding } from './group-findings';

const finding = (key: string, part: Partial<FindingView> = {}): FindingView => ({
  key,
  code: 'V09',
  slug: 'latitude',
  title: 'Latitude outside −90 to 90',
  severity: 'error',
  sheet: 'MAR',
  row: 5,
  column: 'B',
  message: `message ${key}`,
  remedy: 'Mend it.',
  remedyKind: 'mend',
  ...part,
});
const waived = {
  by: { id: 'p', name: 'Ann Lee', initials: 'AL' },
  reason: 'known',
  at: '2026-01-01T00:00:00Z',
};

test('findings of one rule stand together, errors before warnings before notes', () => {
  const groups = groupFindings([
    finding('n', { code: 'V60', severity: 'note' }),
    finding('w1', { code: 'V20', severity: 'warning' }),
    finding('e1'),
    finding('w2', { code: 'V20', severity: 'warning' }),
  ]);
  expect(groups.map(({ code, items }) => [code, items.length])).toEqual([
    ['V09', 1],
    ['V20', 2],
    ['V60', 1],
  ]);
});

test('one rule that finds errors and warnings makes two groups', () => {
  const groups = groupFindings([finding('a', { severity: 'warning' }), finding('b')]);
  expect(groups.map(({ severity }) => severity)).toEqual(['error', 'warning']);
});

test('a waived finding stays in its group but is no longer open', () => {
  const [group] = groupFindings([
    finding('a', { severity: 'warning', waived }),
    finding('b', { severity: 'warning' }),
  ]);
  expect(group?.items).toHaveLength(2);
  expect(group?.open.map(({ key }) => key)).toEqual(['b']);
});

test('notes are hidden until the address asks for them, and all can be hidden', () => {
  expect(shownSeverities(null)).toEqual(['error', 'warning']);
  expect(shownSeverities('note')).toEqual(['note']);
  expect(shownSeverities('none')).toEqual([]);
  expect(countBySeverity([finding('a'), finding('b', { severity: 'note' })])).toEqual({
    error: 1,
    warning: 0,
    note: 1,
  });
});

test('stepping goes round the end in both directions and starts at either end', () => {
  const list = [finding('a'), finding('b'), finding('c')];
  expect(stepFinding(list, null, 1)?.key).toBe('a');
  expect(stepFinding(list, null, -1)?.key).toBe('c');
  expect(stepFinding(list, 'c', 1)?.key).toBe('a');
  expect(stepFinding(list, 'a', -1)?.key).toBe('c');
  expect(stepFinding([], 'a', 1)).toBeNull();
});

test('a cell is marked by its worst open finding and holds the messages of all', () => {
  const marks = cellMarks([
    finding('w', { severity: 'warning' }),
    finding('e'),
    finding('gone', { severity: 'error', row: 6, waived }),
    finding('sheet', { row: null, column: null }),
  ]);
  expect([...marks.keys()]).toEqual(['MAR!B5']);
  expect(marks.get('MAR!B5')).toEqual({ worst: 'error', messages: ['message w', 'message e'] });
});
