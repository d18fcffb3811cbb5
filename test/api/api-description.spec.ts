import { Validator } from '@seriousme/openapi-schema-validator';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { makeApp, type TestApp } from '../support/api-app';

let app: TestApp;
beforeAll(async () => {
  app = await makeApp();
});
afterAll(() => app.close());

interface Layer {
  readonly route?: { readonly path: string; readonly stack: readonly { method?: string }[] };
  readonly handle: { readonly stack?: readonly Layer[] };
}
interface Described {
  readonly openapi: string;
  readonly paths: Record<string, Record<string, object>>;
}

/** Every route that Express knows, as in `get /api/v1/rigs/{rigId}`. */
function routesOf(layers: readonly Layer[]): string[] {
  return layers.flatMap(({ route, handle }) => {
    if (!route) return routesOf(handle.stack ?? []);
    const path = route.path.replace(/:(\w+)/g, '{$1}');
    const methods = new Set(route.stack.map(({ method }) => method));
    return [...methods].map((method) => `${String(method)} ${path}`);
  });
}

async function describedRoutes(): Promise<string[]> {
  const { body } = await app.agent().get('/api/v1/openapi.json').expect(200);
  return Object.entries((body as Described).paths).flatMap(([path, methods]) =>
    Object.keys(methods).map((method) => `${method} ${path}`),
  );
}

it('is a valid OpenAPI 3.1 document', async () => {
  const { body } = await app.agent().get('/api/v1/openapi.json').expect(200);
  expect((body as Described).openapi).toBe('3.1.0');
  const result = await new Validator().validate(body as Described & Record<string, unknown>);
  expect(result.errors ?? []).toEqual([]);
  expect(result.valid).toBe(true);
});

it('describes every route, and no other', async () => {
  const routes = routesOf(app.express.router.stack as unknown as Layer[]);
  expect(routes).toContain('post /api/v1/session');
  expect((await describedRoutes()).sort()).toEqual(routes.sort());
});

it('is there as a page that loads nothing from elsewhere', async () => {
  const page = await app.agent().get('/api/v1/docs').expect(200);
  expect(page.type).toBe('text/html');
  expect(page.text).not.toMatch(/<script|<link|<img|https?:\/\//);
  for (const route of await describedRoutes()) {
    const [method = '', path = ''] = route.split(' ');
    expect(page.text).toContain(`<code>${method.toUpperCase()} ${path}</code>`);
  }
});
