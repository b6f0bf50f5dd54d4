/**
 * The import rules of DEVELOPERS.md, 'Folders', exactly: (server | app) → report → sync → access → records → sheet → budget → channel.
 * A folder imports itself and any folder to its right, never to its left; server and app never import each other.
 */
const ORDER = ['report', 'sync', 'access', 'records', 'sheet', 'budget', 'channel']

const leftOf = ORDER.map((folder, place) => ({
  name: `${folder}-imports-only-to-its-right`,
  severity: 'error',
  from: { path: `^lib/${folder}/` },
  to: {
    path: `^(app/|lib/(server${ORDER.slice(0, place)
      .map((left) => `|${left}`)
      .join('')})/)`,
  },
}))

module.exports = {
  forbidden: [
    ...leftOf,
    { name: 'server-does-not-import-app', severity: 'error', from: { path: '^lib/server/' }, to: { path: '^app/' } },
    { name: 'app-does-not-import-server', severity: 'error', from: { path: '^app/' }, to: { path: '^lib/server/' } },
    {
      name: 'app-takes-only-types-from-the-server-side',
      severity: 'error',
      from: { path: '^app/' },
      to: { path: '^lib/(report|sync|access|records)/', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'client-code-imports-only-sheet-budget-channel',
      severity: 'error',
      from: { path: '^app/.*client/' },
      to: { path: '^lib/', pathNot: '^lib/(sheet|budget|channel)/' },
    },
    {
      name: 'client-code-does-not-reach-the-services',
      severity: 'error',
      from: { path: '^app/.*client/' },
      to: { path: '^app/(services\\.ts|api/)' },
    },
    {
      name: 'drivers-stay-in-records',
      severity: 'error',
      from: { path: '^(app|lib)/', pathNot: '^lib/records/' },
      to: { path: 'node_modules/(@prisma|better-sqlite3|sqlite3)/' },
    },
    {
      name: 'product-does-not-import-tests',
      severity: 'error',
      from: { path: '^(app|lib)/' },
      to: { path: '^tests/' },
    },
    {
      name: 'no-circles',
      severity: 'error',
      from: { path: '^(app|lib)/', pathNot: '^lib/records/generated/' },
      to: { circular: true },
    },
    {
      name: 'no-orphans',
      severity: 'error',
      from: {
        orphan: true,
        path: '^(app|lib)/',
        pathNot: [
          '^lib/records/generated/',
          '\\.d\\.ts$',
          '(^|/)(page|layout|route|not-found|error|global-error|icon)\\.tsx?$',
          '\\.css$',
          '^lib/server/boot\\.mjs$',
        ],
      },
      to: {},
    },
    {
      name: 'resolvable',
      severity: 'error',
      from: { path: '^(app|lib)/' },
      to: { couldNotResolve: true, pathNot: '\\.css$' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^(\\.next|dist)/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: { exportsFields: ['exports'], conditionNames: ['import', 'node', 'default', 'types'] },
  },
}
