import { Validator } from '@seriousme/openapi-schema-validator';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { aBrowser, aTestApp, type TestApp } from '../../support/test-app.ts';

let app: TestApp;
beforeAll(async () => {
  app = await aTestApp();
});
afterAll(() => app.close());

describe('the OpenAPI document', () => {
  it('is valid by the published schema of OpenAPI 3.1, and lists every route with its method', async () => {
    const document = (await aBrowser(app).get('/api/openapi.json').expect(200)).body as { openapi: string; paths: Record<string, Record<string, unknown>> };
    const result = await new Validator().validate(document);
    expect(result).toMatchObject({ valid: true });
    for (const { endpoint } of app.mounted) expect(document.paths[endpoint.path.replace(/:([A-Za-z]+)/g, '{$1}')]?.[endpoint.method], endpoint.path).toBeTruthy();
  });
});
