/** Who may import whom, each rule with its reason. DEVELOPERS.md draws the same picture. */
const rooms = [
  'terms',
  'wording',
  'stats',
  'questions',
  'feed',
  'records',
  'config',
  'answers',
  'present',
  'digests',
  'workspaces',
  'start',
];

/** For each room, the rooms it may import beside itself; a name ending in * may be imported for its types only. */
const mayImport = {
  terms: [],
  wording: ['terms'],
  stats: ['terms'],
  questions: ['terms'],
  feed: ['terms'],
  records: ['terms'],
  config: ['terms'],
  answers: ['terms', 'wording', 'stats', 'questions*'],
  present: ['terms', 'wording', 'answers*'],
  digests: ['terms', 'questions', 'answers*'],
  workspaces: ['terms', 'present', 'answers', 'questions'],
  start: rooms,
};

const pattern = (names) => `^src/(${names.join('|')})/`;

const roomRules = Object.entries(mayImport).flatMap(([room, allowed]) => {
  const whole = allowed.filter((name) => !name.endsWith('*'));
  const typesOnly = allowed.filter((name) => name.endsWith('*')).map((name) => name.slice(0, -1));
  const reachable = [room, ...whole, ...typesOnly];
  const rules = [
    {
      name: `${room}-keeps-to-its-level`,
      severity: 'error',
      comment: `${room} may import ${allowed.join(', ') || 'nothing'}: arrows point down the levels, siblings never meet`,
      from: { path: pattern([room]) },
      to: { path: '^src/', pathNot: pattern(reachable) },
    },
  ];
  if (typesOnly.length > 0) {
    rules.push({
      name: `${room}-takes-types-only`,
      severity: 'error',
      comment: `${room} knows the shapes of ${typesOnly.join(', ')} but runs none of their code`,
      from: { path: pattern([room]) },
      to: { path: pattern(typesOnly), dependencyTypesNot: ['type-only'] },
    });
  }
  return rules;
});

const onlyIn = (what, modulePath, homes, reason) => ({
  name: `${what}-only-in-${homes.join('-and-')}`,
  severity: 'error',
  comment: reason,
  from: { path: '^src/', pathNot: homes.map((home) => `^src/${home}/`) },
  to: { path: modulePath },
});

module.exports = {
  forbidden: [
    ...roomRules,
    {
      name: 'no-cycles',
      severity: 'error',
      comment: 'a cycle means two files are one; shared words belong in terms',
      from: { path: '^src/' },
      to: { circular: true },
    },
    {
      name: 'pure-rooms-touch-nothing-outside',
      severity: 'error',
      comment:
        'terms, wording, stats, questions, answers and present take instants, randomness and data as arguments; ' +
        'hashing (node:crypto) is a pure function and the one exception',
      from: { path: pattern(['terms', 'wording', 'stats', 'questions', 'answers', 'present']) },
      to: { dependencyTypes: ['core'], pathNot: '^(node:)?crypto$' },
    },
    onlyIn(
      'chat-library',
      'node_modules/@slack/',
      ['workspaces/slack'],
      'the platform can be replaced in one folder',
    ),
    onlyIn('file-reader', 'node_modules/@duckdb/', ['feed'], 'how files are read is the feed’s secret'),
    onlyIn(
      'database',
      'node_modules/(better-sqlite3|kysely|pg)/',
      ['records'],
      'the store can be replaced in one folder',
    ),
    onlyIn(
      'distribution-library',
      'node_modules/jstat/',
      ['stats'],
      'every figure goes through our own finished functions',
    ),
    onlyIn(
      'worker-pool',
      'node_modules/piscina/',
      ['start'],
      'threads are machinery; the core does not know of them',
    ),
    onlyIn(
      'chart-grammar',
      'node_modules/(vega|vega-lite|vega-[a-z-]+)/',
      ['present/picture'],
      'what a picture shows is said in one folder; nothing else hangs on the grammar',
    ),
    onlyIn(
      'rasteriser',
      'node_modules/@resvg/',
      ['start'],
      'a picture ends at SVG; making a file of it is machinery, and native code',
    ),
    {
      name: 'drawing-is-loaded-late',
      severity: 'error',
      comment:
        'the libraries for pictures take a third of a second to load; only the thread that draws waits for them',
      from: { path: '^src/', pathNot: '^src/start/pictures/worker\\.ts$' },
      to: { path: '^src/(present/picture/toSvg|start/pictures/png)\\.ts$' },
    },
    {
      name: 'the-drawing-thread-is-imported-late',
      severity: 'error',
      comment: 'an import at the head of a file would load the libraries for pictures at the start',
      from: { path: '^src/' },
      to: { path: '^src/start/pictures/worker\\.ts$', dependencyTypesNot: ['dynamic-import'] },
    },
    {
      name: 'nobody-imports-start',
      severity: 'error',
      comment: 'start wires everything and is wired by nothing',
      from: { path: '^src/', pathNot: '^src/start/' },
      to: { path: '^src/start/' },
    },
    {
      name: 'source-never-imports-tests',
      severity: 'error',
      comment: 'tests look at the source, not the other way round',
      from: { path: '^src/' },
      to: { path: '^test/' },
    },
    {
      name: 'no-unresolvable',
      severity: 'error',
      comment: 'an import that resolves to nothing would slip through every other rule',
      from: { path: '^src/' },
      to: { couldNotResolve: true },
    },
  ],
  options: {
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'node', 'types', 'default'],
    },
    doNotFollow: { path: 'node_modules' },
  },
};
