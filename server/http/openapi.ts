import * as z from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint';
import { claimContent, putClaimBatch } from '#shared/contracts/claims';
import { problemDocument, reference } from '#shared/contracts/fields';
import { jobContent, putJobBatch } from '#shared/contracts/jobs';

type Json = Record<string, unknown>;

/**
 * The OpenAPI 3.1 description of the given calls, made from their contracts.
 * Source of the format: OpenAPI Specification 3.1.0; schemas are JSON Schema 2020-12.
 */
export function describeApi(endpoints: readonly Endpoint[], version: string): Json {
  const paths: Record<string, Json> = {};
  for (const endpoint of endpoints) {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [endpoint.method]: operation(endpoint) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Underseam',
      version,
      description:
        'Weekly margins, labour overrun and the record of a rust-protection network. Money is integer minor units, time minutes, volume millilitres, shares fractions.',
    },
    tags: [...new Set(endpoints.map((endpoint) => endpoint.topic))].map((name) => ({ name })),
    paths,
    components: {
      securitySchemes: {
        person: { type: 'http', scheme: 'bearer', bearerFormat: 'JWT' },
        pushKey: {
          type: 'http',
          scheme: 'bearer',
          description: 'A push key of one branch: usk_<id>_<secret>.',
        },
      },
      schemas: { Problem: schemaOf(problemDocument, 'output') },
    },
  };
}

function operation(endpoint: Endpoint): Json {
  const { access } = endpoint;
  return {
    tags: [endpoint.topic],
    summary: endpoint.summary,
    description: access === 'public' ? 'No token needed.' : accessText(access),
    security:
      access === 'public' ? [] : [{ person: [] }, ...(access.pushKey ? [{ pushKey: [] }] : [])],
    parameters: [
      ...parametersOf(endpoint.params, 'path'),
      ...parametersOf(endpoint.query, 'query'),
    ],
    ...(endpoint.body && {
      requestBody: { required: true, content: contentOf(endpoint, endpoint.body) },
    }),
    responses: { ...successes(endpoint), default: PROBLEM },
  };
}

/** Items of a batch are judged one by one, so its contract leaves them open; here they are told. */
const BATCH_ITEMS: ReadonlyMap<string, z.ZodType> = new Map<string, z.ZodType>([
  [putJobBatch.path, jobContent.extend({ jobRef: reference })],
  [putClaimBatch.path, claimContent.extend({ claimRef: reference })],
]);

/** A body by its media type. Source: OpenAPI Specification 3.1.0, "Considerations for File Uploads". */
function contentOf(endpoint: Endpoint, body: NonNullable<Endpoint['body']>): Json {
  if (body === 'image') return { 'image/jpeg': {}, 'image/png': {} };
  if (body === 'file') {
    const file = { type: 'string', contentMediaType: 'text/csv' };
    return {
      'multipart/form-data': {
        schema: { type: 'object', properties: { file }, required: ['file'] },
      },
    };
  }
  return { 'application/json': { schema: bodyOf(endpoint, body) } };
}

function bodyOf(endpoint: Endpoint, body: z.ZodType): Json {
  const schema = schemaOf(body, 'input');
  const item = BATCH_ITEMS.get(endpoint.path);
  if (item) {
    for (const list of Object.values(schema['properties'] as Record<string, Json>)) {
      list['items'] = schemaOf(item, 'input');
    }
  }
  return schema;
}

const PROBLEM: Json = {
  description: 'A refusal, as RFC 9457 describes it.',
  content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
};

function accessText(access: Exclude<Endpoint['access'], 'public'>): string {
  const roles = access.roles.map((role) => role.replaceAll('_', ' ')).join(', ');
  return `For ${roles}${access.pushKey ? ', or a push key of the branch' : ''}.`;
}

function successes(endpoint: Endpoint): Json {
  const content =
    typeof endpoint.out === 'object'
      ? { 'application/json': { schema: schemaOf(endpoint.out, 'output') } }
      : endpoint.out === 'csv'
        ? { 'text/csv': { schema: { type: 'string' } } }
        : endpoint.out === 'image'
          ? { 'image/jpeg': {} }
          : endpoint.out === 'pdf'
            ? { 'application/pdf': {} }
            : endpoint.out === 'events'
              ? { 'text/event-stream': { schema: { type: 'string' } } }
              : undefined;
  return Object.fromEntries(
    endpoint.statuses.map((status) => [
      String(status),
      { description: DESCRIPTIONS[status] ?? 'Done.', ...(content && { content }) },
    ]),
  );
}

const DESCRIPTIONS: Record<number, string> = {
  200: 'Done, or read.',
  201: 'Created.',
  202: 'Taken up; ask again how far it is.',
  204: 'Done; nothing to say.',
};

function parametersOf(schema: z.ZodObject, place: 'path' | 'query'): Json[] {
  const whole = schemaOf(schema, 'input');
  const required = (whole['required'] as string[] | undefined) ?? [];
  return Object.entries((whole['properties'] as Record<string, Json> | undefined) ?? {}).map(
    ([name, property]) => ({
      name,
      in: place,
      required: place === 'path' || required.includes(name),
      schema: property,
    }),
  );
}

function schemaOf(schema: z.ZodType, io: 'input' | 'output'): Json {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, {
    io,
    unrepresentable: 'any',
    target: 'draft-2020-12',
  }) as Json;
  return rest;
}
