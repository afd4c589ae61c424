import type { ApplicationRef } from '@angular/core';
import { bootstrapApplication } from '@angular/platform-browser';
import { useSentences } from '@shared/contract';
import { App } from './app';
import { appConfig } from './app.config';
import type { LocaleFile } from './core/shell/locale';

export function start(sentences: LocaleFile['sentences']): Promise<ApplicationRef> {
  if (sentences) useSentences(sentences);
  return bootstrapApplication(App, appConfig);
}
