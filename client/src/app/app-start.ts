import type { ApplicationRef } from '@angular/core';
import { bootstrapApplication } from '@angular/platform-browser';
import { App } from './app';
import { appConfig } from './app.config';

export const start = (): Promise<ApplicationRef> => bootstrapApplication(App, appConfig);
