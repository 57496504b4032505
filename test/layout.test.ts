// The house rules of who may import whom, checked on the real imports. Each rule says why it is there, and the reason
// is printed beside every import that breaks it. Invariant: a check that saw no module, or no import, has failed.
// Source of the rules: the map of the house in DEVELOPERS.md.
import { cruise } from 'dependency-cruiser';
import type { ICruiseOptions, ICruiseResult } from 'dependency-cruiser';
import { beforeAll, expect, test } from 'vitest';

interface HouseRule {
  readonly name: string;
  readonly reason: string;
  readonly from: { path: string; pathNot?: string };
  readonly to: {
    path?: string;
    pathNot?: string;
    circular?: boolean;
    couldNotResolve?: boolean;
    dependencyTypes?: 'core'[];
  };
}

const OURS = '^(grammar|server|client|test|\\.ci)/';
const SOLVERS = '^server/core/(balance|burn|equilibrium|engine|hazard|account)/';

const RULES: readonly HouseRule[] = [
  {
    name: 'no-cycles',
    reason: 'data flows one way: text, tree, scenario, findings, views; no room calls back',
    from: { path: '^(grammar|server|client)/' },
    to: { circular: true },
  },
  {
    name: 'grammar-stands-alone',
    reason: 'a formatter with no server must be able to use the grammar',
    from: { path: '^grammar/' },
    to: { path: OURS, pathNot: '^grammar/' },
  },
  {
    name: 'core-stands-alone',
    reason: 'core would run in a script, with no editor and no source text',
    from: { path: '^server/core/' },
    to: { path: OURS, pathNot: '^server/core/' },
  },
  {
    name: 'scenario-knows-no-view',
    reason: 'meaning is here; findings, wording and views are built from it',
    from: { path: '^server/scenario/' },
    to: { path: OURS, pathNot: '^(grammar/|server/(core|scenario)/)' },
  },
  {
    name: 'wording-knows-no-view',
    reason: 'wording turns values and facts into text for every view alike',
    from: { path: '^server/wording/' },
    to: { path: OURS, pathNot: '^(grammar/|server/((core/quantity|scenario|wording)/|findings/finding\\.ts$))' },
  },
  {
    name: 'findings-from-facts',
    reason: 'a finding is made from facts of the scenario and words, and computes nothing',
    from: { path: '^server/findings/' },
    to: { path: `^(client|server/(features|report|lsp|jobs|drawing)|server/[^/]+\\.ts$)|${SOLVERS}` },
  },
  {
    name: 'features-are-thin',
    reason: 'a feature answers from the evaluated scenario alone: no report, no solver, no registry of findings',
    from: { path: '^server/features/' },
    to: {
      path: OURS,
      pathNot: `^(grammar/|server/(features|scenario|wording|core/(quantity|substance))/|server/findings/finding\\.ts$)`,
    },
  },
  {
    name: 'reports-are-thin',
    reason: 'a report answers from the evaluated scenario alone: no feature, no solver, no registry of findings',
    from: { path: '^server/report/' },
    to: {
      path: OURS,
      pathNot: `^(grammar/|server/(report|drawing|scenario|wording|core/(quantity|substance))/|server/findings/finding\\.ts$)`,
    },
  },
  {
    name: 'drawing-from-wording',
    reason: 'the same drawing serves the report and the results view, so it needs words and nothing else of ours',
    from: { path: '^server/drawing/' },
    to: { path: OURS, pathNot: '^server/(drawing|wording)/' },
  },
  {
    name: 'nothing-imports-an-entry',
    reason: 'the programs stand at the end of the way; what they share lives in a room of its own',
    from: { path: '^(grammar|client|server/(core|scenario|wording|findings|features|report|drawing|jobs|lsp)/)' },
    to: { path: '^server/(cli/|[^/]+\\.ts$)' },
  },
  {
    name: 'jobs-run-core',
    reason:
      'what a worker does is a function of core from plain data to plain data; a worker knows no text and no client',
    from: { path: '^server/jobs/' },
    to: { path: OURS, pathNot: '^server/(jobs|core)/' },
  },
  {
    name: 'nothing-imports-the-worker',
    reason: 'the worker is a program of its own; what it does is in serve-jobs.ts',
    from: { path: '^(grammar|server|client)/' },
    to: { path: '^server/jobs/worker\\.ts$' },
  },
  {
    name: 'lsp-reports-nothing',
    reason: "the server converts and schedules; documents for printing are the command line's",
    from: { path: '^server/lsp/' },
    to: { path: `^server/(report|drawing)/|${SOLVERS}` },
  },
  {
    name: 'protocol-in-lsp',
    reason: 'only lsp/ and the entries that choose a transport know the language server protocol',
    from: { path: '^(grammar|server)/', pathNot: '^server/(lsp/|main\\.ts$|browser\\.ts$|cli\\.ts$)' },
    to: { path: 'vscode-languageserver|vscode-jsonrpc' },
  },
  {
    name: 'editor-in-client',
    reason: "the server answers any editor; only the client knows VS Code's own interface",
    from: { path: '^(grammar|server)/' },
    to: { path: '^vscode$|node_modules/(vscode-languageclient|@types/vscode)/' },
  },
  {
    name: 'client-talks-protocol',
    reason: "the client shows what the server answers; another editor's client could skip it",
    from: { path: '^client/' },
    to: { path: '^(grammar|server|test)/' },
  },
  {
    name: 'no-tests-in-the-product',
    reason: 'what ships must not need what checks it',
    from: { path: '^(grammar|server|client)/' },
    to: { path: '^(test|\\.ci)/' },
  },
  {
    name: 'core-without-node',
    reason: 'these rooms run in a browser too, so they take no module of Node',
    from: { path: '^(grammar/|server/(core|scenario|wording|findings|features|report|drawing)/)' },
    to: { dependencyTypes: ['core'] },
  },
  {
    name: 'imports-resolve',
    reason: 'an import that cannot be followed escapes every other rule',
    from: { path: '^(grammar|server|client)/' },
    to: { couldNotResolve: true, pathNot: '^vscode$' },
  },
];

let result: ICruiseResult;
beforeAll(async () => {
  const options: ICruiseOptions = {
    baseDir: process.cwd(),
    tsPreCompilationDeps: true, // type imports count as well
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'types', 'default'],
    },
    doNotFollow: { path: 'node_modules' },
    validate: true,
    ruleSet: {
      forbidden: RULES.map(({ name, reason, from, to }) => ({ name, comment: reason, severity: 'error', from, to })),
    },
  };
  const { output } = await cruise(['grammar', 'server', 'client'], options);
  if (typeof output === 'string') throw new Error('expected the result as data');
  result = output;
}, 120_000);

test('the check saw our modules and their imports', () => {
  const seen = result.modules.map(({ source }) => source);
  expect(seen).toContain('grammar/tree.ts');
  expect(seen).toContain('server/main.ts');
  expect(seen).toContain('client/extension.ts');
  expect(result.summary.totalDependenciesCruised).toBeGreaterThan(3);
});

test.each(RULES)('$name: $reason', ({ name, reason }) => {
  const broken = result.summary.violations.filter(({ rule }) => rule.name === name);
  expect(broken.map(({ from, to }) => `${from} imports ${to}, but ${reason}`)).toEqual([]);
});
