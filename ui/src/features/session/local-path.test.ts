import { localPath } from './local-path';
import { tokenOf } from './use-link-token';

test.each([
  ['/estimates?slice=lgm', '/estimates?slice=lgm'],
  ['//evil.example/x', '/desk'],
  ['/\\evil.example', '/desk'],
  ['https://evil.example', '/desk'],
  [null, '/desk'],
])('after sign-in %s leads to %s', (wanted, target) => {
  expect(localPath(wanted)).toBe(target);
});

test('the token of a link is found in its query or its fragment', () => {
  expect(tokenOf({ search: '?token=abc', hash: '' })).toBe('abc');
  expect(tokenOf({ search: '', hash: '#token=abc' })).toBe('abc');
  expect(tokenOf({ search: '', hash: '' })).toBe('');
});
