import { v5 } from 'uuid';

/** Names under this are the demo's ids: the same at every load. */
const NAMESPACE = '6f1a7a0e-6a1d-4b5f-9a53-1c2b7d0e9f44';

/** The demo's id of a thing, by its name. */
export const seedId = (name: string): string => v5(name, NAMESPACE);
