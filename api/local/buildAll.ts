import { buildStale } from './build';

// `npm run build`: client and API bundle, where their sources have changed.
try {
  const { stamp, rebuilt } = await buildStale();
  process.stdout.write(`Build ${stamp}: ${rebuilt.join(' and ') || 'nothing had changed'}.\n`);
} catch (error) {
  process.stderr.write(`${(error as Error).message}\n`);
  process.exit(1);
}
