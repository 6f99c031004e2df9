import { testApp, type TestApp } from './support/test-app';

interface Layer {
  route?: { path: string; methods: Record<string, boolean> };
}

let service: TestApp;
let document: { openapi: string; info: object; paths: Record<string, Record<string, object>> };
beforeAll(async () => {
  service = await testApp();
  document = (await service.http.get('/api/openapi.json').expect(200)).body;
});
afterAll(() => service.close());

/** Routes as Express has them, without the document itself. */
function runningRoutes(): string[] {
  const { stack } = (service.app.getHttpAdapter().getInstance() as { router: { stack: Layer[] } }).router;
  return stack
    .flatMap(({ route }) =>
      route ? Object.keys(route.methods).map((method) => `${method} ${route.path}`) : [],
    )
    .filter((route) => route !== 'get /api/openapi.json')
    .sort();
}

test('the document is OpenAPI 3.1 with a title and a version', () => {
  expect(document.openapi).toMatch(/^3\.1\./);
  expect(document.info).toMatchObject({ title: 'Siltlight', version: '1' });
});

test('the document and the running server know the same routes', () => {
  const described = Object.entries(document.paths).flatMap(([path, methods]) =>
    Object.keys(methods).map((method) => `${method} ${path.replace(/\{([^}]+)\}/g, ':$1')}`),
  );
  expect(described.sort()).toEqual(runningRoutes());
});

test('every address lies under /api/v1 or /api/health', () => {
  expect(Object.keys(document.paths).filter((path) => !/^\/api\/(v1|health)\//.test(path))).toEqual([]);
});

test('nothing of the schema library is left in the document', () => {
  expect(JSON.stringify(document)).not.toContain('x-nestjs_zod');
});
