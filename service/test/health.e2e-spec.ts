import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
beforeAll(async () => {
  service = await testApp();
});
afterAll(() => service.close());

test('liveness answers without signing in', async () => {
  const answer = await service.http.get('/api/health/live').expect(200);
  expect(answer.body).toEqual({ status: 'live' });
});

test('readiness names the database write, the schema, the disk and the outbox', async () => {
  const answer = await service.http.get('/api/health/ready').expect(200);
  expect(answer.body.status).toBe('ready');
  expect(answer.body.checks.map((check: { name: string }) => check.name)).toEqual([
    'database-write',
    'schema',
    'disk',
    'outbox',
  ]);
});
