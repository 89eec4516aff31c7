import * as z from 'zod/mini';
import { problemSchema } from '../../src/domain/handover/problem';
import { PROTOCOL_HEADER } from './guards';
import type { Route } from './route';

type Json = Readonly<Record<string, unknown>>;

/** OpenAPI 3.1 of the declared routes. Documents of the Book appear as objects without inner shape. */
export function openApiOf(routes: readonly Route[], version: string): Json {
  const paths: Record<string, Record<string, Json>> = {};
  for (const route of routes) {
    const path = route.spec.path.replaceAll(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.spec.method.toLowerCase()]: operationOf(route) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Holdoff',
      version,
      description:
        'Holdoff records what people declare and computes what physics says. It is never an interlock.',
    },
    paths,
    components: {
      securitySchemes: { accessToken: { type: 'http', scheme: 'bearer', bearerFormat: 'JWT' } },
      schemas: { Problem: jsonSchema(problemSchema) },
    },
  };
}

function operationOf({ spec }: Route): Json {
  const { permission } = spec;
  const needs = permission.who === 'person' ? `person: ${permission.roles.join(', ')}` : permission.who;
  return {
    summary: spec.summary,
    'x-permission': needs,
    security: permission.who === 'anyone' ? [] : [{ accessToken: [] }],
    parameters: [
      ...(spec.method === 'GET'
        ? []
        : [{ name: PROTOCOL_HEADER, in: 'header', required: true, schema: { type: 'string', const: '1' } }]),
      ...parametersOf(spec.params, 'path'),
      ...parametersOf(spec.query, 'query'),
    ],
    ...(spec.body === undefined
      ? {}
      : {
          requestBody: { required: true, content: { 'application/json': { schema: jsonSchema(spec.body) } } },
        }),
    responses: { ...answersOf(spec.answers), default: problemAnswer },
  };
}

const problemAnswer: Json = {
  description: 'A problem, in words',
  content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
};

function answersOf(answers: Route['spec']['answers']): Json {
  if (204 in answers) return { 204: { description: 'Done' } };
  const shape = answers[200];
  if ('stream' in shape)
    return { 200: { description: 'One JSON object a line', content: { [shape.stream]: {} } } };
  return {
    200: { description: 'Done', content: { 'application/json': { schema: jsonSchema(shape, 'output') } } },
  };
}

function parametersOf(schema: z.ZodMiniType | undefined, place: 'path' | 'query'): Json[] {
  if (schema === undefined) return [];
  const { properties = {}, required = [] } = jsonSchema(schema) as {
    properties?: Record<string, Json>;
    required?: readonly string[];
  };
  return Object.entries(properties).map(([name, inner]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: inner,
  }));
}

function jsonSchema(schema: z.ZodMiniType, io: 'input' | 'output' = 'input'): Json {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
  return rest;
}
