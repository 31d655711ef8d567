import { z } from 'zod';
import { ProblemBody, PROBLEMS } from '#shared/http/problem.ts';
import type { AnyEndpoint } from './api.ts';

type Json = Record<string, unknown>;

function schemaOf(schema: z.ZodType, io: 'input' | 'output'): Json {
  const { $schema: _dialect, ...json } = z.toJSONSchema(schema, { io, unrepresentable: 'any', target: 'draft-2020-12' });
  return json;
}

function parametersOf(schema: z.ZodType | undefined, place: 'path' | 'query'): Json[] {
  if (!schema) return [];
  const { properties = {}, required = [] } = schemaOf(schema, 'input') as { properties?: Record<string, Json>; required?: string[] };
  return Object.entries(properties).map(([name, json]) => ({ name, in: place, required: place === 'path' || required.includes(name), schema: json }));
}

const VERSION_HEADER: Json = { name: 'If-Match', in: 'header', required: true, schema: { type: 'string' }, description: 'The version last seen, e.g. "3"' };

function problemAnswers(entry: AnyEndpoint): Json {
  const codes: (keyof typeof PROBLEMS)[] = ['malformed', 'invalid', 'unexpected', 'busy'];
  if (entry.right !== 'public') codes.push('not-signed-in', 'forbidden');
  if (entry.params) codes.push('not-found');
  if (entry.creates) codes.push('conflict');
  if (entry.versioned) codes.push('stale', 'version-needed');
  return Object.fromEntries(codes.map((code) => [String(PROBLEMS[code].status), { $ref: '#/components/responses/Problem' }]));
}

function operationOf(entry: AnyEndpoint): Json {
  const media = entry.streams ?? 'application/json';
  const content = entry.streams ? { [media]: { schema: {} } } : entry.reply ? { [media]: { schema: schemaOf(entry.reply, 'output') } } : undefined;
  const good = content ? { description: 'Done', content } : { description: 'Done' };
  const accepted = entry.accepts ? { content: { [entry.accepts]: { schema: {} } } } : entry.body ? { required: true, content: { 'application/json': { schema: schemaOf(entry.body, 'input') } } } : undefined;
  return {
    operationId: `${entry.method}${entry.path.replace('/api', '').replaceAll(/[/:.-]+(\w)/g, (_all, letter: string) => letter.toUpperCase())}`,
    summary: entry.summary,
    description: entry.right === 'public' ? 'Needs no session.' : entry.right === 'account' ? 'Needs a session.' : `Needs the right \`${entry.right}\`.`,
    tags: [entry.path.split('/')[2] ?? 'api'],
    ...(entry.right === 'public' ? { security: [] } : {}),
    parameters: [...parametersOf(entry.params, 'path'), ...parametersOf(entry.query, 'query'), ...(entry.versioned ? [VERSION_HEADER] : [])],
    ...(accepted ? { requestBody: accepted } : {}),
    responses: { [entry.reply || entry.streams ? '200' : '204']: good, ...(entry.creates ? { '201': good } : {}), ...problemAnswers(entry) },
  };
}

/** The OpenAPI 3.1 document, printed from the same entries that are served. */
export function openApiDocument(entries: readonly AnyEndpoint[], publicUrl: string): Json {
  const paths: Record<string, Json> = {};
  for (const entry of entries) {
    const path = entry.path.replaceAll(/:(\w+)/g, '{$1}');
    (paths[path] ??= {})[entry.method] = operationOf(entry);
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Loafmark', version: '1', description: 'Quality and fault log for small soapmaking workshops.' },
    servers: [{ url: publicUrl }],
    security: [{ session: [] }],
    paths,
    components: {
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: publicUrl.startsWith('https:') ? '__Host-lm' : 'lm' } },
      responses: { Problem: { description: 'A problem (RFC 9457)', content: { 'application/problem+json': { schema: schemaOf(ProblemBody, 'output') } } } },
    },
  };
}
