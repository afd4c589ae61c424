import { createHash, createHmac, randomBytes, timingSafeEqual } from 'node:crypto';

/** A refresh token: 256 random bits that mean nothing by themselves. */
export const newToken = (): string => randomBytes(32).toString('base64url');

export const digestOfToken = (token: string): Buffer => createHash('sha256').update(token).digest();

const keyed = (secret: Buffer, purpose: string, text: string): Buffer =>
  createHmac('sha256', secret).update(`${purpose}\0${text}`).digest();

/**
 * The token that follows a used one. Derived, so that a second tab that asks with the same token gets the
 * same successor although only digests are stored; without the server's secret nobody can derive it.
 */
export const successorOf = (token: string, secret: Buffer): string =>
  keyed(secret, 'refresh', token).toString('base64url');

/** The mark of a device on which an account has signed in: an id, and our signature for that account. */
export function markDevice(account: string, secret: Buffer): string {
  const id = randomBytes(16).toString('base64url');
  return `${id}.${signatureOf(id, account, secret)}`;
}

/** The device's id where the mark was made by us for this account. */
export function knownDevice(
  mark: string | undefined,
  account: string,
  secret: Buffer,
): string | undefined {
  const [id, signature, more] = (mark ?? '').split('.');
  if (!id || !signature || more !== undefined) return undefined;
  const expected = Buffer.from(signatureOf(id, account, secret));
  const given = Buffer.from(signature);
  return given.length === expected.length && timingSafeEqual(given, expected) ? id : undefined;
}

const signatureOf = (id: string, account: string, secret: Buffer) =>
  keyed(secret, 'device', `${id} ${account}`).toString('base64url');

/** What a guess is counted under: a digest, so that the table holds no addresses. */
export const bucketOf = (kind: string, ...parts: string[]): string =>
  `${kind} ${createHash('sha256').update(JSON.stringify(parts)).digest('base64url')}`;
