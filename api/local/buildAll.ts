import { buildStale } from './build';

// `npm run build`: client and API bundle, where their sources have changed.
const { stamp, rebuilt } = await buildStale();
process.stdout.write(`Build ${stamp}: ${rebuilt.join(' and ') || 'nothing had changed'}.\n`);
