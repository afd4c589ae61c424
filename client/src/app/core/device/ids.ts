import { InjectionToken } from '@angular/core';
import { v7 } from 'uuid';

/** Makes a new UUIDv7: ids of later events sort behind earlier ones of the same device. */
export const NEW_ID = new InjectionToken<() => string>('new id', {
  providedIn: 'root',
  factory: () => () => v7(),
});
