import { loadTranslations } from '@angular/localize';

/** Where a chosen language is kept; English needs no table and no request. */
export const LOCALE_KEY = 'lampline.locale';
const codePattern = /^[a-z]{2}(-[A-Za-z]{2,8})?$/;

interface LocaleFile {
  readonly translations: Readonly<Record<string, string>>;
}

/** Loads the table of the chosen language before anything is drawn; without one the texts stay English. */
export async function loadLocale(): Promise<void> {
  const code = localStorage.getItem(LOCALE_KEY);
  if (!code || code === 'en' || !codePattern.test(code)) return;
  try {
    const response = await fetch(`/locale/${code}.json`);
    if (!response.ok) return;
    const { translations } = (await response.json()) as LocaleFile;
    loadTranslations({ ...translations });
    document.documentElement.lang = code;
  } catch {
    // No signal at the first visit in this language: English is better than nothing.
  }
}
