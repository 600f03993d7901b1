import { TestApp } from '../support/app';
import { contracts } from '../support/walk-contracts';

/** What the description must hold is checked against the OpenAPI Specification 3.1.0 (sections 4.8.1 to 4.8.24), by hand. */
interface Described {
  openapi: string;
  info: { title: string; version: string };
  tags: { name: string }[];
  paths: Record<string, Record<string, Operation>>;
  components: {
    securitySchemes: Record<string, { type: string }>;
    schemas: Record<string, unknown>;
  };
}
interface Operation {
  tags: string[];
  summary: string;
  security: Record<string, string[]>[];
  parameters: { name: string; in: string; required: boolean; schema: object }[];
  requestBody?: { content: Record<string, { schema: object }> };
  responses: Record<string, { description: string; content?: Record<string, { schema: object }> }>;
}

let app: TestApp;
let described: Described;
beforeAll(async () => {
  app = await TestApp.start();
  described = (await app.call('get', '/api/openapi.json')).body as Described;
});
afterAll(() => app.stop());

const operations = (): [string, string, Operation][] =>
  Object.entries(described.paths).flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, one]): [string, string, Operation] => [
      path,
      method,
      one,
    ]),
  );
/** Every node of a document, with its place. */
function* nodesOf(value: unknown, place = '#'): Generator<[string, Record<string, unknown>]> {
  if (typeof value !== 'object' || value === null) return;
  if (!Array.isArray(value)) yield [place, value as Record<string, unknown>];
  for (const [key, inner] of Object.entries(value)) yield* nodesOf(inner, `${place}/${key}`);
}

const JSON_BODY = ['application/json'];
const PHOTO_BODY = ['image/jpeg', 'image/png'];
const FILE_BODY = ['multipart/form-data'];

describe('GET /api/openapi.json', () => {
  it('given nobody signed in, is there as JSON', async () => {
    const { status, headers } = await app.call('get', '/api/openapi.json');
    expect([status, headers.get('content-type')]).toEqual([200, 'application/json; charset=utf-8']);
    expect(described).toMatchObject({ openapi: '3.1.0', info: { title: 'Underseam' } });
    expect(described.info.version).toBe('0.0.0-test');
  });

  it('given every contract, describes exactly those', () => {
    const paths = contracts.map(
      ([, { method, path }]) => `${method} ${path.replace(/:(\w+)/g, '{$1}')}`,
    );
    expect(
      operations()
        .map(([path, method]) => `${method} ${path}`)
        .sort(),
    ).toEqual(paths.sort());
  });

  it('given names in a path, describes each as a required parameter and no other', () => {
    for (const [path, , { parameters }] of operations()) {
      const named = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name).sort();
      const inPath = parameters.filter((one) => one.in === 'path');
      expect(inPath.map(({ name }) => name).sort()).toEqual(named);
      expect(inPath.every(({ required }) => required)).toBe(true);
      expect(new Set(parameters.map((one) => `${one.in} ${one.name}`)).size).toBe(
        parameters.length,
      );
    }
  });

  it('given any operation, names its tag, who may call it, its success and how it refuses', () => {
    const tags = new Set(described.tags.map(({ name }) => name));
    const schemes = described.components.securitySchemes;
    for (const [, , { tags: own, summary, security, responses, requestBody }] of operations()) {
      expect(own.every((tag) => tags.has(tag))).toBe(true);
      expect(summary.length).toBeGreaterThan(5);
      for (const scheme of security.flatMap(Object.keys)) expect(schemes).toHaveProperty(scheme);
      expect(Object.keys(responses).some((status) => /^2\d\d$/.test(status))).toBe(true);
      expect(responses).toHaveProperty('default');
      expect(Object.values(responses).every(({ description }) => description.length > 0)).toBe(
        true,
      );
      const taken = Object.keys(requestBody?.content ?? { 'application/json': {} });
      expect([JSON_BODY, PHOTO_BODY, FILE_BODY]).toContainEqual(taken);
    }
  });

  it('given any reference in it, leads to something in it', () => {
    let references = 0;
    for (const [place, node] of nodesOf(described)) {
      const reference = node['$ref'];
      if (typeof reference !== 'string') continue;
      references += 1;
      const found = reference
        .replace(/^#\//, '')
        .split('/')
        .reduce<unknown>(
          (at, step) => (at as Record<string, unknown> | undefined)?.[step.replaceAll('~1', '/')],
          described,
        );
      expect([place, reference, typeof found]).toEqual([place, reference, 'object']);
    }
    expect(references).toBeGreaterThan(40);
  });

  it('given any schema of an object that is taken, allows no unknown field', () => {
    for (const [, , { requestBody }] of operations()) {
      if (!requestBody) continue;
      const json = requestBody.content['application/json'];
      // An upload is described by its type alone.
      if (!json) continue;
      for (const [place, node] of nodesOf(json.schema)) {
        if (node['type'] === 'object' && node['properties']) {
          expect([place, node['additionalProperties']]).toEqual([place, false]);
        }
      }
    }
  });

  it('given the body of a job, describes what is required of it', () => {
    const schema = described.paths['/api/branches/{branch}/jobs/{jobRef}']!['put']!.requestBody!
      .content['application/json']!.schema as { required: string[]; properties: object };
    expect([...schema.required].sort()).toEqual(['actual', 'completedOn', 'package', 'vehicle']);
    expect(schema.properties).toHaveProperty('agreedExtras');
  });
});

describe('GET /api/docs', () => {
  it('given a browser without a network, needs nothing from elsewhere', async () => {
    const page = await app.call('get', '/api/docs');
    expect([page.status, page.headers.get('content-type')]).toEqual([
      200,
      'text/html; charset=utf-8',
    ]);
    expect(page.text).not.toMatch(/https?:\/\//);
    expect(page.headers.get('content-security-policy')).toContain("default-src 'none'");
    const files = [...page.text.matchAll(/(?:src|href)="([^"]+)"/g)].map(([, file]) => file!);
    expect(files.length).toBeGreaterThan(2);
    for (const file of files) {
      const answer = await app.call('get', file);
      expect([file, answer.status]).toEqual([file, 200]);
    }
  });
});
