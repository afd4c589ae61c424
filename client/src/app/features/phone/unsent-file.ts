import type { OwnEvent } from '../../core/device/device-database';

/** Everything that the server has not got, as a file: nobody needs this program to read it. */
export interface UnsentFile {
  readonly format: 'lampline-unsent';
  readonly version: 1;
  readonly savedAt: string;
  readonly person: string;
  readonly events: readonly OwnEvent[];
}

export const unsentFile = (
  person: string,
  events: readonly OwnEvent[],
  now: number,
): UnsentFile => ({
  format: 'lampline-unsent',
  version: 1,
  savedAt: new Date(now).toISOString(),
  person,
  events,
});

/** Hands a file over to the browser's downloads. */
export function save(file: UnsentFile): void {
  const url = URL.createObjectURL(
    new Blob([JSON.stringify(file, undefined, 2)], { type: 'application/json' }),
  );
  const link = document.createElement('a');
  link.href = url;
  link.download = `lampline-unsent-${file.savedAt.slice(0, 10)}.json`;
  link.click();
  URL.revokeObjectURL(url);
}
