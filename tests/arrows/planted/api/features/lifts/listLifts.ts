import { eq } from 'drizzle-orm';

/** Planted: a use case that knows Drizzle. */
export const condition = eq;
