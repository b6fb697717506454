import { z } from 'zod';
import type { Endpoint } from '../../shared/api/endpoint.ts';
import { Problem } from '../../shared/api/problem.ts';
import { roles, may } from '../../shared/people/permissions.ts';

const json = (schema: z.ZodType, io: 'input' | 'output') => z.toJSONSchema(schema, { io, unrepresentable: 'any', target: 'draft-2020-12' });

/** The OpenAPI 3.1 document of the mounted endpoints, from the same schemas that parse the calls. */
export function openApiDocument(endpoints: readonly Endpoint[]): object {
  const paths: Record<string, Record<string, unknown>> = {};
  for (const e of endpoints) {
    const path = e.path.replace(/:([A-Za-z]+)/g, '{$1}');
    (paths[path] ??= {})[e.method] = operation(e);
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Combwright', version: '1', description: 'Lengths in mm, masses in kg, angles in radians, times in UTC.' },
    paths,
    components: {
      schemas: { Problem: json(Problem, 'output') },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'cw_access' } },
    },
  };
}

function operation(e: Endpoint): object {
  const open = ['anyone', 'hold link', 'develop'].includes(e.permission);
  const parameters = [...parametersOf(e.params, 'path'), ...parametersOf(e.query, 'query')];
  const hasBody = e.kind === 'upload' || Object.keys((e.body as z.ZodObject).shape ?? {}).length > 0;
  return {
    summary: e.summary,
    description: open ? `May be called by: ${e.permission}.` : `May be called by: ${roles.filter((r) => may(r, e.permission)).join(', ')}.`,
    ...(open ? { security: [] } : { security: [{ session: [] }] }),
    ...(parameters.length > 0 ? { parameters } : {}),
    ...(hasBody ? { requestBody: { required: true, content: bodyContent(e) } } : {}),
    responses: {
      [e.status]: {
        description: 'Done.',
        ...(e.kind === 'file' ? { content: { 'application/octet-stream': {} } } : { content: { 'application/json': { schema: json(e.reply, 'output') } } }),
      },
      default: { description: 'A problem, in words.', content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } } },
    },
  };
}

function bodyContent(e: Endpoint): object {
  if (e.kind !== 'upload') return { 'application/json': { schema: json(e.body, 'input') } };
  return { 'multipart/form-data': { schema: { type: 'object', required: ['file'], properties: { file: { type: 'string', format: 'binary' } } } } };
}

function parametersOf(schema: z.ZodType, where: 'path' | 'query'): object[] {
  const shape = (schema as z.ZodObject).shape ?? {};
  return Object.entries(shape).map(([name, field]) => ({
    name,
    in: where,
    required: where === 'path' || !(field as z.ZodType).safeParse(undefined).success,
    schema: json(field as z.ZodType, 'input'),
  }));
}
