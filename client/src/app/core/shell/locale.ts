import { loadTranslations } from '@angular/localize';

/** Where a chosen language is kept; English needs no table and no request. */
const LOCALE_KEY = 'lampline.locale';
const codePattern = /^[a-z]{2}(-[A-Za-z]{2,8})?$/;

/** `/locale/<code>.json`: the client's texts by message id, and the contract's sentences by code. */
export interface LocaleFile {
  readonly translations: Readonly<Record<string, string>>;
  readonly sentences?: Readonly<Record<string, string>>;
}

/**
 * Loads the table of the chosen language before anything is drawn; without one the texts stay English.
 * @returns the sentences, for whoever loads the contract
 */
export async function loadLocale(): Promise<LocaleFile['sentences']> {
  try {
    const code = localStorage.getItem(LOCALE_KEY);
    if (!code || code === 'en' || !codePattern.test(code)) return undefined;
    const response = await fetch(`/locale/${code}.json`);
    if (!response.ok) return undefined;
    const { translations, sentences } = (await response.json()) as LocaleFile;
    loadTranslations({ ...translations });
    document.documentElement.lang = code;
    return sentences;
  } catch {
    // No signal at the first visit in this language: English is better than nothing.
    return undefined;
  }
}
