import { z } from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint';
import { problemSchema, problemTypes } from '#shared/contracts/problems';

/** OpenAPI 3.1 from the endpoints that are registered, and from nothing else. */
export function openApiDocument(endpoints: readonly Endpoint[]) {
  const paths: Record<string, Record<string, unknown>> = {};
  for (const endpoint of endpoints) {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [endpoint.method]: operation(endpoint) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Clauseway',
      version: '1',
      description: `Problems (RFC 9457) have one of these types: ${Object.keys(problemTypes).join(', ')}.`,
    },
    paths,
    components: {
      schemas: { Problem: jsonSchema(problemSchema, 'output') },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'clauseway.session_token' } },
    },
  };
}

function operation(endpoint: Endpoint) {
  const status = String(endpoint.status ?? 200);
  return {
    summary: endpoint.summary,
    security: endpoint.open ? [] : [{ session: [] }],
    parameters: [
      ...parameters(endpoint.params, 'path'),
      ...parameters(endpoint.query, 'query'),
      ...(endpoint.versioned ? [header('If-Match', 'Version that the writer saw')] : []),
      ...(endpoint.idempotent
        ? [header('Idempotency-Key', 'New for each act, the same for its repeats')]
        : []),
    ],
    ...(endpoint.body || endpoint.files ? { requestBody: requestBody(endpoint) } : {}),
    responses: {
      [status]: { description: endpoint.summary, ...content(endpoint) },
      default: {
        description: 'A problem',
        content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
      },
    },
  };
}

function content(endpoint: Endpoint) {
  if (endpoint.sends)
    return { content: { [endpoint.sends]: { schema: { type: 'string', format: 'binary' } } } };
  if (!endpoint.response) return {};
  return { content: { 'application/json': { schema: jsonSchema(endpoint.response, 'output') } } };
}

function requestBody(endpoint: Endpoint) {
  const schema = endpoint.body ? jsonSchema(endpoint.body, 'input') : { type: 'object' };
  if (!endpoint.files) return { required: true, content: { 'application/json': { schema } } };
  const files = Object.fromEntries(
    endpoint.files.map((name) => [name, { type: 'string', format: 'binary' }]),
  );
  const properties = { ...objectOf(schema.properties), ...files };
  return { required: true, content: { 'multipart/form-data': { schema: { ...schema, properties } } } };
}

function parameters(schema: z.ZodType | undefined, where: 'path' | 'query') {
  if (!schema) return [];
  const described = jsonSchema(schema, 'input');
  const required = new Set(Array.isArray(described.required) ? described.required : []);
  return Object.entries(objectOf(described.properties)).map(([name, part]) => ({
    name,
    in: where,
    required: where === 'path' || required.has(name),
    schema: part,
  }));
}

function header(name: string, description: string) {
  return { name, in: 'header', required: true, description, schema: { type: 'string' } };
}

function jsonSchema(schema: z.ZodType, io: 'input' | 'output'): Record<string, unknown> {
  const { $schema: _, ...described } = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
  return described;
}

function objectOf(value: unknown): Record<string, unknown> {
  return typeof value === 'object' && value !== null ? { ...value } : {};
}
