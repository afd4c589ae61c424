import type { z } from 'zod';
import type { Role } from './primitives';

/** One route as data: the API serves it, OpenAPI describes it, the role matrix checks it. */
export interface Route {
  readonly method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  /** Express path, with `:id`. */
  readonly path: string;
  readonly summary: string;
  /** Who may; `open` needs no sign-in. */
  readonly roles: readonly Role[] | 'open';
  readonly params?: z.ZodObject;
  readonly query?: z.ZodObject;
  readonly body?: z.ZodType;
  readonly answer?: z.ZodType;
  /** What success answers; 204 where nothing is said. */
  readonly status?: 200 | 201 | 204;
  /** `If-Match` is required. */
  readonly versioned?: boolean;
  /** `Idempotency-Key` is required: a write that is no event. */
  readonly keyed?: boolean;
}

export const route = <const R extends Route>(definition: R): R => definition;
