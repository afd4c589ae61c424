import { HttpClient, HttpErrorResponse, HttpHeaders } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { problemSchema, type Route } from '@shared/contract';
import { firstValueFrom, timeout } from 'rxjs';
import type { z } from 'zod';
import { Connection } from '../device/connection';
import { ApiError } from './api-error';

/** No answer after so long counts as no answer at all, milliseconds. */
const PATIENCE = 20_000;

type Output<S> = S extends z.ZodType ? z.output<S> : undefined;
type Input<S> = S extends z.ZodType ? z.input<S> : never;

export interface CallOptions<R extends Route> {
  readonly params?: Readonly<Record<string, string | number>>;
  readonly query?: Partial<Input<R['query']>>;
  readonly body?: R['body'] extends z.ZodType ? Input<R['body']> : never;
  /** Row version that was seen, for `If-Match`. */
  readonly version?: number;
  /** For a write that is no event; the same key for every retry of it. */
  readonly key?: string;
}

/** Calls the API by the contract's routes. Failures come as {@link ApiError}. */
@Injectable({ providedIn: 'root' })
export class Api {
  private readonly http = inject(HttpClient);
  private readonly connection = inject(Connection);

  async call<R extends Route>(
    route: R,
    options: CallOptions<R> = {},
  ): Promise<Output<R['answer']>> {
    try {
      const response = await firstValueFrom(this.request(route, options).pipe(timeout(PATIENCE)));
      this.connection.answered();
      return response.body as Output<R['answer']>;
    } catch (error) {
      throw this.translated(error);
    }
  }

  private request(route: Route, options: CallOptions<Route>) {
    const path = route.path.replace(/:(\w+)/g, (_, name: string) =>
      encodeURIComponent(String(options.params?.[name] ?? '')),
    );
    let headers = new HttpHeaders();
    if (options.version !== undefined) headers = headers.set('If-Match', `"${options.version}"`);
    if (options.key !== undefined) headers = headers.set('Idempotency-Key', options.key);
    return this.http.request<unknown>(route.method.toUpperCase(), path, {
      body: options.body as unknown,
      params: { ...options.query } as Record<string, string>,
      headers,
      observe: 'response',
    });
  }

  private translated(error: unknown): ApiError {
    if (error instanceof HttpErrorResponse && error.status !== 0) {
      this.connection.answered();
      const retryAfter = Number(error.headers.get('Retry-After') ?? NaN);
      const problem = problemSchema.safeParse(error.error);
      const code = problem.success ? problem.data.code : 'unreadable';
      const detail = problem.success
        ? problem.data.detail
        : $localize`The server answered something unexpected. Nothing was changed here.`;
      const { fields, details } = problem.data ?? {};
      return new ApiError(
        error.status,
        code,
        detail,
        fields,
        details,
        Number.isFinite(retryAfter) ? retryAfter : undefined,
      );
    }
    this.connection.unanswered();
    return new ApiError(
      0,
      'unreachable',
      $localize`The server can't be reached from here. What is kept on this phone stays.`,
    );
  }
}
