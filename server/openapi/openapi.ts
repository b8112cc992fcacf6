import { z } from 'zod';
import { evaluationSchema } from '../../shared/checks/index.js';
import { designSchema, steelSchema } from '../../shared/design/index.js';
import { PROBLEMS, typeOf } from '../http/problem.js';
import type { RegisteredRoute } from '../http/routes.js';
import type { DocumentedAnswer } from './operation.js';

type Json = Record<string, unknown>;

/** The body of every error answer. */
export const problemSchema = z.looseObject({
  type: z.string().describe('Which kind of problem; the documentation tells about it there'),
  title: z.string(),
  status: z.number(),
  detail: z.string().optional().describe('What happened this time, and what to do'),
  instance: z.string().describe('The number of the request, as the log has it'),
  issues: z
    .array(
      z.strictObject({
        pointer: z.string().describe('JSON pointer into the body'),
        code: z.string(),
        message: z.string(),
      }),
    )
    .optional(),
});

/** Schemas that have a name of their own in the document, and are referred to by it. */
const names = z.registry<{ id: string }>();
names.add(designSchema, { id: 'Design' });
names.add(evaluationSchema, { id: 'Evaluation' });
names.add(steelSchema, { id: 'Steel' });
names.add(problemSchema, { id: 'Problem' });

/** The OpenAPI document of all routes, made from the same schemas that check what comes in. */
export function openApiDocument(routes: readonly RegisteredRoute[]): Json {
  const components: Json = {};
  const schemaOf = (schema: z.ZodType, io: 'input' | 'output'): Json => {
    const { $schema, $defs, ...json } = z.toJSONSchema(schema, { metadata: names, io }) as Json;
    for (const [name, component] of Object.entries(($defs ?? {}) as Json))
      components[name] = withoutId(component);
    return json;
  };
  const paths: Record<string, Json> = {};
  for (const route of routes) {
    const path = route.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method.toLowerCase()]: operationOf(route, schemaOf) };
  }
  const document = {
    openapi: '3.1.0',
    info: {
      title: 'Layerwright',
      version: '1',
      description:
        'Designs of pattern-welded billets: keeping them, and working out what becomes of them. Lengths are in mm, masses ' +
        'in kg, temperatures in °C. Every error is a problem document (RFC 9457) whose type never changes.',
    },
    paths,
    components: {
      schemas: components,
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'layerwright.session' } },
    },
  };
  return JSON.parse(JSON.stringify(document).replaceAll('#/$defs/', '#/components/schemas/')) as Json;
}

type SchemaOf = (schema: z.ZodType, io: 'input' | 'output') => Json;

function operationOf(route: RegisteredRoute, schemaOf: SchemaOf): Json {
  const { operation, body } = route;
  const bodySchema = operation.bodySchema ?? body;
  const isPrivate = route.rule === 'signedIn' || route.rule === 'designOwner';
  return {
    operationId: operation.id,
    tags: [operation.tag],
    summary: operation.summary,
    description: operation.description,
    parameters: parametersOf(route, schemaOf),
    ...(bodySchema
      ? {
          requestBody: {
            required: true,
            content: {
              'application/json': { schema: schemaOf(bodySchema, 'input'), example: operation.bodyExample },
            },
          },
        }
      : {}),
    responses: { ...answersOf(operation.answers, schemaOf), ...problemsOf(route, schemaOf) },
    ...(isPrivate ? { security: [{ session: [] }] } : {}),
  };
}

function parametersOf({ operation, query }: RegisteredRoute, schemaOf: SchemaOf): Json[] {
  const queryJson = query ? schemaOf(query, 'input') : {};
  const inQuery = Object.entries((queryJson['properties'] ?? {}) as Record<string, Json>);
  return [
    ...parameters('path', operation.params ?? {}),
    ...parameters('header', operation.headers ?? {}),
    ...inQuery.map(([name, { description, ...schema }]) => ({ name, in: 'query', description, schema })),
  ];
}

function parameters(place: string, descriptions: Readonly<Record<string, string>>): Json[] {
  return Object.entries(descriptions).map(([name, description]) => ({
    name,
    in: place,
    required: true,
    description,
    schema: { type: 'string' },
  }));
}

function answersOf(answers: Readonly<Record<number, DocumentedAnswer>>, schemaOf: SchemaOf): Json {
  return Object.fromEntries(
    Object.entries(answers).map(([status, { description, schema, type, example, headers }]) => [
      status,
      {
        description,
        ...(headers ? { headers: headersOf(headers) } : {}),
        ...(schema || type
          ? {
              content: {
                [type ?? 'application/json']: {
                  ...(schema ? { schema: schemaOf(schema, 'output') } : {}),
                  example,
                },
              },
            }
          : {}),
      },
    ]),
  );
}

function headersOf(headers: Readonly<Record<string, string>>): Json {
  return Object.fromEntries(
    Object.entries(headers).map(([name, description]) => [name, { description, schema: { type: 'string' } }]),
  );
}

/** The problems of a route by status; several kinds may share one. */
function problemsOf({ operation }: RegisteredRoute, schemaOf: SchemaOf): Json {
  const byStatus = new Map<number, Json>();
  for (const code of operation.problems) {
    const { status, title } = PROBLEMS[code];
    const example = {
      type: typeOf(code),
      title,
      status,
      instance: 'urn:uuid:5d3c6a0e-5a0e-4a39-8a52-3a7f6a1a9c22',
    };
    const earlier = byStatus.get(status);
    byStatus.set(status, { ...earlier, [code]: { value: example } });
  }
  return Object.fromEntries(
    [...byStatus].map(([status, examples]) => [
      status,
      {
        description: Object.keys(examples).join(', '),
        content: { 'application/problem+json': { schema: schemaOf(problemSchema, 'output'), examples } },
      },
    ]),
  );
}

function withoutId(component: unknown): Json {
  const { $id, id, ...rest } = component as Json;
  return rest;
}
