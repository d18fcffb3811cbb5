import { STATUS_CODES } from 'node:http';
import {
  OpenAPIRegistry,
  OpenApiGeneratorV31,
  type ResponseConfig,
  type RouteConfig,
} from '@asteasolutions/zod-to-openapi';
import { problemSchema } from '@stillpier/contract';
import type { Answer, Operation } from './operation';
import { SESSION_COOKIE } from './session';

export type OpenApiDocument = ReturnType<OpenApiGeneratorV31['generateDocument']>;

export const PROBLEM_TYPE = 'application/problem+json';
const JSON_TYPE = 'application/json';
const TOKENS = {
  readToken: 'A token of the account with the scope `read`',
  uploadToken: 'A token of the account with the scope `upload`',
};

/** The OpenAPI 3.1 document of these operations. */
export function buildOpenApi(operations: readonly Operation[]): OpenApiDocument {
  const registry = new OpenAPIRegistry();
  registry.registerComponent('securitySchemes', 'session', {
    type: 'apiKey',
    in: 'cookie',
    name: SESSION_COOKIE,
  });
  for (const [name, description] of Object.entries(TOKENS)) {
    registry.registerComponent('securitySchemes', name, {
      type: 'http',
      scheme: 'bearer',
      description,
    });
  }
  for (const operation of operations) registry.registerPath(toRoute(operation));
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: {
      title: 'Stillpier',
      version: '1',
      description: 'Guide logs of a telescope mount, read and explained. Errors are RFC 9457.',
    },
  });
}

function toRoute(operation: Operation): RouteConfig {
  const { method, path, tag, summary, params, query, headers, body } = operation;
  const answers = Object.entries(operation.answers).map(
    ([status, answer]) => [status, toResponse(answer)] as const,
  );
  const problems = operation.problems.map((status) => [String(status), toProblem(status)] as const);
  return {
    method,
    path,
    summary,
    tags: [tag],
    security: operation.signedIn ? signIns(operation) : [],
    request: {
      ...(params && { params }),
      ...(query && { query }),
      ...(headers && { headers }),
      ...(body && { body: { required: true, content: contentOf(body) } }),
    },
    responses: Object.fromEntries([...answers, ...problems]),
  };
}

/** Any one of them is enough. */
function signIns({ method, byUploadToken }: Operation): Record<string, string[]>[] {
  return [
    { session: [] },
    ...(method === 'get' ? [{ readToken: [] }] : []),
    ...(byUploadToken ? [{ uploadToken: [] }] : []),
  ];
}

function toResponse({ description, schema, contentType }: Answer): ResponseConfig {
  if (!schema) return { description };
  return { description, content: contentOf({ schema, contentType: contentType ?? JSON_TYPE }) };
}

function toProblem(status: number): ResponseConfig {
  const content = contentOf({ schema: problemSchema, contentType: PROBLEM_TYPE });
  return { description: STATUS_CODES[status] ?? 'Refused', content };
}

function contentOf({
  schema,
  contentType,
}: NonNullable<Operation['body']>): Record<string, { schema: typeof schema }> {
  return { [contentType ?? JSON_TYPE]: { schema } };
}
