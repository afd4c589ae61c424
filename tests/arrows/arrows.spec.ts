import { spawnSync } from 'node:child_process';
import { resolve } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';

interface Violation {
  readonly from: string;
  readonly to: string;
  readonly rule: { readonly name: string };
}

/**
 * The folder `planted` is a small project in the same layout, full of imports that the arrows forbid. The
 * same rules that judge the product are run on it.
 */
let violations: readonly Violation[] = [];
beforeAll(() => {
  const root = resolve('.');
  const { stdout } = spawnSync(
    resolve('node_modules/.bin/depcruise'),
    [
      ...['--config', resolve(root, '.dependency-cruiser.cjs')],
      ...['--ts-config', resolve(root, 'tsconfig.json'), '--output-type', 'json'],
      ...['client', 'api', 'shared'],
    ],
    { cwd: resolve('tests/arrows/planted'), encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 },
  );
  const cruised = JSON.parse(stdout) as { summary: { violations: Violation[] } };
  violations = cruised.summary.violations;
});

const rulesAgainst = (file: string) =>
  violations.filter(({ from }) => from.endsWith(file)).map(({ rule }) => rule.name);

describe('A planted import is found', () => {
  it.each([
    ['a screen that imports the server', 'lifts/reachesServer.ts', 'not-in-allowed'],
    ['a feature inside another', 'cases/reachesFeature.ts', 'features-keep-to-themselves'],
    ['a use case with Drizzle', 'lifts/listLifts.ts', 'only-repositories-know-drizzle'],
    ['routes with a repository', 'lifts/routes.ts', 'routes-do-not-reach-repositories'],
    ['an engine with a higher one', 'circuit/reachesUp.ts', 'not-in-allowed'],
    ['a cycle', 'solver/first.ts', 'no-cycles'],
  ])('%s', (_what, file, rule) => {
    expect(rulesAgainst(file)).toContain(rule);
  });

  it('and a legal one is not', () => {
    expect(rulesAgainst('lifts/repository.ts')).toEqual([]);
  });
});
