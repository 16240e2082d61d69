import * as z from 'zod/mini';
import { problemSchema } from '#shared/contracts/problem';
import type { AnyRoute } from './define-route';

type Json = Record<string, unknown>;

/** The OpenAPI 3.1 document, made from the very schemas that check the requests. */
export function openApiDocument(routes: readonly AnyRoute[]): Json {
  const paths: Record<string, Json> = {};
  for (const route of routes) {
    const path = `/api${route.path}`.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method]: operation(route) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Firstcold',
      version: '1',
      description: 'Errors are application/problem+json (RFC 9457).',
    },
    paths,
    components: {
      schemas: { Problem: jsonSchema(problemSchema) },
      securitySchemes: {
        session: { type: 'apiKey', in: 'cookie', name: 'firstcold_session' },
        device: { type: 'apiKey', in: 'cookie', name: 'firstcold_device' },
      },
    },
  };
}

function operation(route: AnyRoute): Json {
  const { access } = route;
  const device = access.kind !== 'public' && access.device ? [{ device: [] }] : [];
  return {
    summary: route.summary,
    description: access.kind === 'action' ? `Needs the permission ${access.action}.` : access.reason,
    security: access.kind === 'public' ? [] : [{ session: [] }, ...device],
    parameters: [...parameters(route.params, 'path'), ...parameters(route.query, 'query')],
    ...requestBody(route),
    responses: {
      [String(route.status ?? (route.response === 'nothing' ? 204 : 200))]: {
        description: 'Done',
        ...(typeof route.response === 'object'
          ? { content: { 'application/json': { schema: jsonSchema(route.response) } } }
          : {}),
      },
      default: {
        description: 'What is wrong',
        content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
      },
    },
  };
}

function requestBody(route: AnyRoute): Json {
  if (route.upload) {
    const schema = {
      type: 'object',
      required: [route.upload.field],
      properties: { [route.upload.field]: { type: 'string', format: 'binary' } },
    };
    return { requestBody: { required: true, content: { 'multipart/form-data': { schema } } } };
  }
  if (!route.body) return {};
  return {
    requestBody: { required: true, content: { 'application/json': { schema: jsonSchema(route.body) } } },
  };
}

function parameters(schema: z.ZodMiniType | undefined, where: 'path' | 'query'): Json[] {
  if (!schema) return [];
  const { properties = {}, required = [] } = jsonSchema(schema) as {
    properties?: Record<string, Json>;
    required?: string[];
  };
  return Object.entries(properties).map(([name, value]) => ({
    name,
    in: where,
    required: where === 'path' || required.includes(name),
    schema: value,
  }));
}

function jsonSchema(schema: z.ZodMiniType): Json {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, {
    io: 'input',
    unrepresentable: 'any',
  }) as Json;
  return rest;
}
