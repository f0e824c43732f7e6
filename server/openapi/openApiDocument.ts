/** The OpenAPI 3.1 document, made from the route table. */
import { createDocument } from 'zod-openapi';
import type { ZodOpenApiOperationObject, ZodOpenApiPathsObject } from 'zod-openapi';

import type { RouteDef } from '@/shared/contract/defineRoute';
import { problemSchema, statusOf } from '@/shared/contract/problems';
import type { ProblemCode } from '@/shared/contract/problems';
import { ROUTE_NAMES, routes } from '@/shared/contract/routes';

import { ACCESS_COOKIE } from '../session/cookies';

const FILE_FORM = { type: 'object' as const, required: ['file'], properties: { file: { type: 'string' as const, format: 'binary' } } };
const bytes = (media: readonly string[]) => Object.fromEntries(media.map((type) => [type, { schema: { type: 'string', format: 'binary' } as const }]));
const json = (schema: RouteDef['answer']) => ({ 'application/json': { schema } });

/** Makes the document; it depends on nothing but the table. */
export function openApiDocument(): ReturnType<typeof createDocument> {
  const paths: ZodOpenApiPathsObject = {};
  for (const name of ROUTE_NAMES) {
    const route: RouteDef = routes[name];
    const path = route.path.replace(/:([a-zA-Z]+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method]: operation(name, route) };
  }
  // The body of an entry is whatever its kind needs: checked by code, and any object to a description.
  const options = { allowEmptySchema: { custom: true } } as const;
  const document = {
    openapi: '3.1.0',
    info: { title: 'Lampstep', version: '1', description: 'Local electrical codes, the maker’s data and licensed practice come first.' },
    components: { securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: ACCESS_COOKIE } } },
    paths,
  } as const;
  return createDocument(document, options);
}

function operation(name: string, route: RouteDef): ZodOpenApiOperationObject {
  const problems: ProblemCode[] = [...route.problems, 'internal'];
  if (route.who !== 'anyone') problems.push('signed-out', 'session-expired');
  if (Array.isArray(route.who)) problems.push('role-missing');
  if (route.method !== 'get') problems.push('cross-site');
  if (route.upload === true) problems.push('bad-input', 'too-large');
  if (route.body !== undefined) problems.push('bad-json', 'not-json', 'too-large', 'bad-input');
  if (route.query !== undefined) problems.push('bad-input');
  if (route.params !== undefined) problems.push('not-found');
  const byStatus = new Map<number, ProblemCode[]>();
  for (const code of new Set(problems)) byStatus.set(statusOf(code), [...(byStatus.get(statusOf(code)) ?? []), code]);
  const failures = Object.fromEntries(
    [...byStatus].map(([status, codes]) => [String(status), { description: codes.join(', '), content: { 'application/problem+json': { schema: problemSchema } } }]),
  );
  return {
    operationId: name,
    summary: route.summary,
    ...(route.who === 'anyone' ? {} : { security: [{ session: [] }] }),
    ...(Array.isArray(route.who) ? { description: `Roles: ${route.who.join(', ')}.` } : {}),
    requestParams: { ...(route.params === undefined ? {} : { path: route.params as never }), ...(route.query === undefined ? {} : { query: route.query as never }) },
    ...(route.body === undefined ? {} : { requestBody: { required: true, content: json(route.body) } }),
    ...(route.upload === true ? { requestBody: { required: true, content: { 'multipart/form-data': { schema: FILE_FORM } } } } : {}),
    responses: { [String(route.status)]: { description: 'Done', content: route.media === undefined ? json(route.answer) : bytes(route.media) }, ...failures },
  };
}
