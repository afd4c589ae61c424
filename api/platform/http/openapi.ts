import { createDocument, type ZodOpenApiPathsObject } from 'zod-openapi';
import { problemSchema, type Route } from '@shared/contract';
import { ACCESS_COOKIE } from './cookies';
import { OUR_HEADER } from './crossSite';

/** Described once, under this name. */
const namedProblem = problemSchema.meta({ id: 'Problem' });

const problem = (description: string) => ({
  description,
  content: { 'application/problem+json': { schema: namedProblem } },
});

/** Express' `:id` as OpenAPI's `{id}`. */
const pathOf = (path: string) => path.replace(/:(\w+)/g, '{$1}');

const header = (name: string, description: string) => ({
  name,
  in: 'header' as const,
  required: true,
  description,
  schema: { type: 'string' as const },
});

function operationOf(name: string, route: Route) {
  const unsafe = route.method !== 'get';
  const signedIn = route.roles !== 'open';
  const status = route.status ?? (route.answer ? 200 : 204);
  return {
    operationId: name,
    summary: route.summary,
    ...(signedIn
      ? { description: `For: ${route.roles.join(', ')}.`, security: [{ access: [] }] }
      : { security: [] }),
    parameters: [
      ...(unsafe ? [header(OUR_HEADER, 'Always 1: keeps cross-site requests out.')] : []),
      ...(route.versioned ? [header('If-Match', 'The quoted version that was seen.')] : []),
      ...(route.keyed ? [header('Idempotency-Key', 'A UUID; the same when sent again.')] : []),
    ],
    requestParams: {
      ...(route.params ? { path: route.params } : {}),
      ...(route.query ? { query: route.query } : {}),
    },
    ...(route.body
      ? { requestBody: { content: { 'application/json': { schema: route.body } } } }
      : {}),
    responses: {
      [status]: {
        description: 'Done.',
        ...(route.answer ? { content: { 'application/json': { schema: route.answer } } } : {}),
      },
      ...(signedIn ? { 401: problem('Not signed in.'), 403: problem('Not for this role.') } : {}),
      ...(route.params ? { 404: problem('Missing, or of another organisation.') } : {}),
      ...(route.versioned
        ? { 412: problem('Changed meanwhile; details.current.'), 428: problem('If-Match missing.') }
        : {}),
      default: problem('Anything else that stands in the way.'),
    },
  };
}

/** OpenAPI 3.1 of the routes, from the schemas that also check every request and answer. */
export function describeRoutes(routes: Readonly<Record<string, Route>>, build: string): object {
  const paths: ZodOpenApiPathsObject = {};
  for (const [name, route] of Object.entries(routes)) {
    const path = pathOf(route.path);
    paths[path] = { ...paths[path], [route.method]: operationOf(name, route) };
  }
  return createDocument({
    openapi: '3.1.0',
    info: { title: 'Lampline', version: build },
    paths,
    components: {
      securitySchemes: { access: { type: 'apiKey', in: 'cookie', name: ACCESS_COOKIE } },
    },
  });
}
