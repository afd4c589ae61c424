/** A program to run: its words, and how its result is counted. */
export interface Suite {
  readonly name: string;
  /** Commands that follow one another; the first that fails ends the suite. */
  readonly commands: readonly (readonly string[])[];
  /**
   * `check`: counts as one, passed when every command ends with 0. `json`: its command writes the
   * figures to the file that `{json}` stands for.
   */
  readonly counts: 'check' | 'json';
}

const bin = (name: string) => `node_modules/.bin/${name}`;

const vitest = (project: string): Suite => ({
  name: project,
  counts: 'json',
  commands: [
    [
      ...[bin('vitest'), 'run', '--project', project, '--maxWorkers=1'],
      ...['--reporter=json', '--outputFile={json}', '--reporter=default'],
    ],
  ],
});

/** Two of these run at a time; the longest first, so that the end is not one long wait. */
export const sideBySide: readonly Suite[] = [
  vitest('reference'),
  {
    name: 'lint',
    counts: 'check',
    commands: [
      [bin('eslint'), '.'],
      [bin('prettier'), '--check', '--log-level=warn', '.'],
    ],
  },
  {
    name: 'types',
    counts: 'check',
    commands: [
      [bin('tsc'), '-p', 'tsconfig.json', '--noEmit'],
      [bin('ngc'), '-p', 'client/tsconfig.app.json', '--noEmit'],
      [bin('tsc'), '-p', 'client/tsconfig.spec.json', '--noEmit'],
      [bin('tsc'), '-p', 'client/tsconfig.worker.json', '--noEmit'],
    ],
  },
  {
    name: 'imports',
    counts: 'check',
    commands: [[bin('depcruise'), 'client', 'api', 'shared', 'seeds', 'tests']],
  },
  vitest('shared'),
  vitest('api'),
  vitest('arrows'),
  {
    name: 'client',
    counts: 'json',
    commands: [[bin('ng'), 'test', '--watch=false', '--reporters=json', '--output-file={json}']],
  },
];

/** Alone: these watch a clock. */
export const alone: readonly Suite[] = [vitest('timing'), vitest('browser')];
