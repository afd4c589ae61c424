import { Injectable, effect, signal } from '@angular/core';

export const themes = ['auto', 'dark', 'daylight'] as const;
export type Theme = (typeof themes)[number];
const THEME_KEY = 'lampline.theme';
const CONTRAST_KEY = 'lampline.contrast';

const kept = (): Theme => {
  const value = localStorage.getItem(THEME_KEY);
  return themes.find((theme) => theme === value) ?? 'auto';
};

/** Dark for the shaft, daylight for the roof; kept on this phone. */
@Injectable({ providedIn: 'root' })
export class ThemeChoice {
  readonly theme = signal<Theme>(kept());
  readonly highContrast = signal(localStorage.getItem(CONTRAST_KEY) === 'high');

  constructor() {
    effect(() => {
      const root = document.documentElement;
      const theme = this.theme();
      localStorage.setItem(THEME_KEY, theme);
      if (theme === 'auto') delete root.dataset['theme'];
      else root.dataset['theme'] = theme;
    });
    effect(() => {
      const root = document.documentElement;
      localStorage.setItem(CONTRAST_KEY, this.highContrast() ? 'high' : 'usual');
      if (this.highContrast()) root.dataset['contrast'] = 'high';
      else delete root.dataset['contrast'];
    });
  }
}
