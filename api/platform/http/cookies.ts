import type { CookieOptions, Request, Response } from 'express';

/** `__Host-` and `__Secure-` work over http on localhost too (verified.md). */
export const ACCESS_COOKIE = '__Host-lampline-access';
export const REFRESH_COOKIE = '__Secure-lampline-refresh';
/** Marks a device on which this account has signed in before. */
export const DEVICE_COOKIE = '__Secure-lampline-device';

const paths: Readonly<Record<string, string>> = {
  [ACCESS_COOKIE]: '/',
  [REFRESH_COOKIE]: '/api/session',
  [DEVICE_COOKIE]: '/api/session',
};

const attributes = (name: string): CookieOptions => ({
  path: paths[name],
  secure: true,
  httpOnly: true,
  sameSite: 'strict',
});

/** The value of one cookie of the request; undefined where it is missing or given twice. */
export function readCookie(request: Request, name: string): string | undefined {
  const values = (request.get('Cookie') ?? '')
    .split(';')
    .map((pair) => pair.trim())
    .filter((pair) => pair.startsWith(`${name}=`))
    .map((pair) => pair.slice(name.length + 1));
  return values.length === 1 ? values[0] : undefined;
}

/** @param maxAge milliseconds */
export function setCookie(response: Response, name: string, value: string, maxAge: number): void {
  response.cookie(name, value, { ...attributes(name), maxAge });
}

export function clearCookie(response: Response, name: string): void {
  response.clearCookie(name, attributes(name));
}
