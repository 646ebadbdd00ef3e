import { z } from 'zod';
import { ACCOUNT_PERMISSIONS, type Permission, WORKSHOP_PERMISSIONS } from '../../domain/permissions.ts';
import { type RuledRoute } from './api-route.ts';

/** One endpoint: where its module lies below src/pages, the method that it exports, and the route itself. */
export interface Endpoint {
  /** Such as `/api/workshops/[workshop]/settings`. */
  readonly path: string;
  readonly method: string;
  readonly route: RuledRoute['route'];
}

type Schema = Record<string, unknown> & {
  readonly properties?: Readonly<Record<string, unknown>>;
  readonly required?: readonly string[];
};

/**
 * The API as an OpenAPI 3.1 document, from the data by which its routes check, answer and refuse.
 * @param server the address that paths stand below
 */
export function describeApi(endpoints: readonly Endpoint[], server: string): Record<string, unknown> {
  const paths: Record<string, Record<string, unknown>> = {};
  for (const endpoint of endpoints) {
    const path = endpoint.path.replace(/\[(\w+)\]/g, '{$1}');
    paths[path] = { ...paths[path], [endpoint.method.toLowerCase()]: describe(endpoint) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Centrepop',
      version: '1',
      description: 'What its own pages ask. Writes name their Origin.',
    },
    servers: [{ url: server }],
    paths,
    components: { schemas: { Refusal: schemaOf(Refusal, 'output') }, securitySchemes: { session: SESSION } },
  };
}

const SESSION = {
  type: 'apiKey',
  in: 'cookie',
  name: 'session_token',
  description: 'Set by signing in. The name begins with the installation’s own id and a full stop.',
};

const Refusal = z.object({
  error: z.object({
    code: z.string(),
    message: z.string(),
    fields: z.record(z.string(), z.string()),
    stored: z.unknown().optional(),
  }),
});

function describe({ path, method, route }: Endpoint) {
  const { verb, form, reply, answer } = route;
  const { may, kind } = verb.rule;
  const params = schemaOf(route.params, 'input');
  const body = schemaOf(route.body, 'input');
  const names = [...path.matchAll(/\[(\w+)\]/g)].map(([, name]) => name ?? '');
  const inPath = names.map((name) => ({
    name,
    in: 'path',
    required: true,
    schema: params.properties?.[name] ?? { type: 'string' },
  }));
  const inQuery = Object.entries(kind === 'read' ? (body.properties ?? {}) : {}).map(([name, schema]) => ({
    name,
    in: 'query',
    required: body.required?.includes(name) ?? false,
    schema,
  }));
  const parameters = [...inPath, ...inQuery];
  const who = whoMay(may);
  return {
    operationId: operationOf(method, path),
    'x-permission': may,
    'x-who-may': who,
    security: who.includes('anyone') ? [] : [{ session: [] }],
    ...(parameters.length > 0 && { parameters }),
    ...(kind === 'write' && { requestBody: { content: contentOf(body, form !== undefined) } }),
    responses: {
      '200': reply
        ? { description: 'Done; what comes is something else than JSON.' }
        : { description: 'Done.', content: { 'application/json': { schema: schemaOf(answer, 'output') } } },
      ...(form && { '303': { description: 'Done, asked by a plain form: where to go on.' } }),
      default: {
        description: 'Refused, in sentences for the person.',
        content: { 'application/json': { schema: { $ref: '#/components/schemas/Refusal' } } },
      },
    },
  };
}

/** A form may be plain; one with a file in it comes in parts. */
function contentOf(schema: Schema, plain: boolean): Record<string, { schema: Schema }> {
  const types = [
    'application/json',
    ...(plain ? ['application/x-www-form-urlencoded'] : []),
    ...(schema.properties?.['file'] === undefined ? [] : ['multipart/form-data']),
  ];
  return Object.fromEntries(types.map((type) => [type, { schema }]));
}

function operationOf(method: string, path: string): string {
  const words = path.replace('/api/', '').split(/[^A-Za-z]+/);
  return method.toLowerCase() + words.map((word) => word.charAt(0).toUpperCase() + word.slice(1)).join('');
}

function whoMay(permission: Permission): readonly string[] {
  const table: Record<string, readonly string[]> = { ...WORKSHOP_PERMISSIONS, ...ACCOUNT_PERMISSIONS };
  return table[permission] ?? [];
}

function schemaOf(schema: z.ZodType, io: 'input' | 'output'): Schema {
  const { $schema: _version, ...plain } = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
  return plain as Schema;
}
