import './app/core/shell/without-eval';
import { loadLocale } from './app/core/shell/locale';
import { allowOwnScripts } from './app/core/shell/trusted-scripts';

allowOwnScripts();
const sentences = await loadLocale();
// Texts at the top of a module are looked up when it loads: every other module comes after the table.
const { start } = await import('./app/app-start');
await start(sentences);
