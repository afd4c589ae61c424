import { sentences } from '@shared/contract';
import { execFileSync } from 'node:child_process';
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { PSEUDO_LOCALE, pseudoTable } from './pseudoText';

const MESSAGES = 'dist/messages/messages.json';

/**
 * Extracts the client's messages and puts the pseudo-locale beside a built client. A page takes it when
 * `localStorage['lampline.locale']` is {@link PSEUDO_LOCALE}. Takes about 20 s.
 */
export function writePseudoLocale(clientFolder: string): void {
  execFileSync(
    process.execPath,
    ['node_modules/@angular/cli/bin/ng.js', 'extract-i18n', '--no-progress'],
    { stdio: 'pipe' },
  );
  const { translations } = JSON.parse(readFileSync(MESSAGES, 'utf8')) as {
    readonly translations: Readonly<Record<string, string>>;
  };
  const folder = join(clientFolder, 'locale');
  mkdirSync(folder, { recursive: true });
  writeFileSync(
    join(folder, `${PSEUDO_LOCALE}.json`),
    JSON.stringify({
      translations: pseudoTable(translations),
      sentences: pseudoTable(sentences),
    }),
  );
}
