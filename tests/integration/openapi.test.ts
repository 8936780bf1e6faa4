import { readdirSync } from 'node:fs';
import { Validator } from '@seriousme/openapi-schema-validator';
import { describe, expect, it } from 'vitest';
import { GET } from '@/app/api/openapi/route';
import { ROUTES } from '@/app/api/openapi/routes';
import { methodsOf } from '@/lib/server/openapi/document';
import { OPERATIONS } from '@/lib/server/openapi/operations';
import { callRoute } from '@/tests/factories';

/** Every folder with a route, from the disk. Sign-in itself belongs to next-auth; the document describes itself by hand. */
const folders = readdirSync('app/api', { recursive: true, encoding: 'utf8' })
  .filter((file) => file.endsWith('/route.ts'))
  .map((file) => file.slice(0, -'/route.ts'.length))
  .filter((folder) => folder !== 'auth/[...nextauth]' && folder !== 'openapi');

describe('the OpenAPI document', () => {
  it('knows every route and every method, and none besides', () => {
    // A new route: add it to app/api/openapi/routes.ts and to lib/server/openapi/operations.ts.
    expect(Object.keys(ROUTES).sort()).toEqual(folders.sort());
    const operations = Object.entries(ROUTES).flatMap(([folder, module]) => {
      const exported = Object.keys(module).filter((name) => /^(GET|POST|PUT|PATCH|DELETE)$/.test(name));
      // Each says what it takes: it goes through the wrapper.
      expect(
        methodsOf(module)
          .map(([method]) => method)
          .sort(),
        folder,
      ).toEqual(exported.sort());
      return exported.map((method) => `${method} ${folder}`);
    });
    expect(Object.keys(OPERATIONS).sort()).toEqual(operations.sort());
  });

  it('is valid OpenAPI 3.1, by another library’s reading', async () => {
    const response = await callRoute(GET);
    expect(response.status).toBe(200);
    const document = (await response.json()) as { openapi: string; paths: Record<string, Record<string, unknown>> };
    const validator = new Validator();
    const result = await validator.validate(document);
    expect(result.errors ?? []).toEqual([]);
    expect(result.valid).toBe(true);
    expect(validator.version).toBe('3.1');
    expect(document.paths['/api/layouts/{layoutId}/operations'].post).toMatchObject({
      parameters: [{ name: 'layoutId', in: 'path', required: true, schema: { type: 'string', format: 'uuid' } }],
    });
  });
});
