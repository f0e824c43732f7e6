/**
 * Which room may import which. What may import React lives under shared/ui; everything else also runs in Node.
 * A room that is not named as a target of another is closed to it.
 */
const rooms = {
  '^app/': { may: ['^shared/ui/(screens|theme|api)/'], as: 'routes show screens; the outermost layout also sets up theme and client' },
  '^shared/ui/theme/': { may: ['^shared/ui/theme/', '^fonts/'], as: 'the theme knows only itself and the fonts' },
  '^shared/ui/components/': { may: ['^shared/ui/(components|theme)/', '^shared/quantity/', '^shared/workings/plot\\.ts$'], as: 'parts know the theme, how a quantity is printed and what a sheet draws' },
  '^shared/ui/api/': { may: ['^shared/ui/api/', '^shared/(contract|record|quantity)/', '^flows/'], as: 'the client knows the contract, the record and the engine' },
  '^shared/ui/hooks/': {
    may: ['^shared/ui/(hooks|api|components|theme)/', '^shared/(contract|record|quantity|workings)/', '^flows/'],
    as: 'hooks stand on the client and the engine',
  },
  '^shared/ui/screens/': {
    may: ['^shared/ui/(screens|components|theme|hooks|api)/', '^shared/(contract|record|quantity|workings)/', '^flows/(?!library/)'],
    as: 'screens stand on everything that is not the server; trees come from it, never from the library',
  },
  '^shared/quantity/': { may: ['^shared/quantity/'], as: 'quantities know nothing else' },
  '^shared/workings/': { may: ['^shared/(workings|quantity)/'], as: 'the sheets know quantities only' },
  '^shared/record/': { may: ['^shared/(record|quantity)/'], as: 'the record knows its own form only' },
  '^shared/contract/': { may: ['^shared/contract/', '^flows/document/', '^flows/machine/events\\.ts$', '^shared/record/recordEntry\\.ts$'], as: 'the contract knows the documents, the events and the form of an entry' },
  '^flows/': { may: ['^flows/', '^shared/(quantity|workings)/'], as: 'the engine knows quantities and workings' },
  '^db/(?!seeds/)': { may: ['^db/(?!seeds/)', '^flows/document/'], as: 'tables know the documents' },
  '^db/seeds/': {
    may: ['^db/', '^flows/', '^shared/(record|quantity|contract|workings)/', '^server/(?!cli/|adapters/)'],
    as: 'the demo is played through the engine and the services of the server, so that it holds no row that the server would not write',
  },
  '^server/(?!cli/|adapters/fakes/)': {
    may: ['^server/(?!cli/|adapters/fakes/)', '^db/(?!seeds/)', '^flows/', '^shared/(contract|record|quantity|workings)/'],
    as: 'the server that goes into production knows neither fakes nor demo data',
  },
  '^server/(cli|adapters/fakes)/': { may: ['^server/', '^db/', '^flows/', '^shared/(contract|record|quantity|workings)/'], as: 'the commands set the rest up' },
};

const ownFolders = '^(app|flows|server|db|shared|fonts|tests|docs)/';

/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [
    ...Object.entries(rooms).map(([from, { may, as }]) => ({
      name: `room ${from}`,
      comment: as,
      severity: 'error',
      from: { path: from },
      to: { path: ownFolders, pathNot: may },
    })),
    { name: 'no-cycles', severity: 'error', comment: 'two files that need each other are one, or need a third', from: {}, to: { circular: true } },
    { name: 'resolvable', severity: 'error', comment: 'an import that leads nowhere', from: {}, to: { couldNotResolve: true, pathNot: '\\.(ttf|css)$' } },
    {
      name: 'react-under-shared-ui',
      severity: 'error',
      comment: 'what may import React lives under shared/ui',
      from: { pathNot: '^(app/|shared/ui/|tests/shared/ui/|node_modules/)' },
      to: { path: 'node_modules/(react|react-dom|react-native[^/]*|expo[^/]*|@expo/[^/]+|@xstate/react|@tanstack/react-query|react-hook-form|@hookform/resolvers)/' },
    },
    {
      name: 'pure-rooms-no-node',
      severity: 'error',
      comment: 'pure rooms run anywhere',
      from: { path: '^(flows|shared/(contract|quantity|workings|record))/' },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'pure-rooms-packages',
      severity: 'error',
      comment: 'packages that pure rooms may use',
      from: { path: '^(flows|shared/(contract|quantity))/' },
      to: { path: 'node_modules/', pathNot: 'node_modules/(zod|xstate|@noble/hashes|canonicalize|uuid)/' },
    },
    {
      name: 'workings-packages',
      severity: 'error',
      comment: 'sheets read their inputs with zod and solve networks with ml-matrix',
      from: { path: '^shared/workings/' },
      to: { path: 'node_modules/', pathNot: 'node_modules/(zod|ml-matrix)/' },
    },
    {
      name: 'record-packages',
      severity: 'error',
      comment: 'the record also reads and signs its export; jose runs anywhere',
      from: { path: '^shared/record/' },
      to: { path: 'node_modules/', pathNot: 'node_modules/(zod|@noble/hashes|canonicalize|uuid|jose)/' },
    },
    {
      name: 'client-no-server-packages',
      severity: 'error',
      comment: 'these have no place in a browser',
      from: { path: '^(app|shared/ui)/' },
      to: { path: 'node_modules/(pg|kysely|express|graphile-worker|nodemailer|bcryptjs|pino[^/]*|smtp-server)/', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'no-tools-in-production',
      severity: 'error',
      comment: 'development packages are not there in production',
      from: { path: '^(app|flows|db|shared|server/(?!cli/|adapters/fakes/))' },
      to: { dependencyTypes: ['npm-dev'], dependencyTypesNot: ['type-only'], pathNot: 'node_modules/@types/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^(dist|build|\\.expo|\\.lampstep|coverage|test-results)/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.server.json' },
    enhancedResolveOptions: { extensions: ['.web.tsx', '.web.ts', '.tsx', '.ts', '.mjs', '.cjs', '.js', '.json'], exportsFields: ['exports'], conditionNames: ['import', 'require', 'node', 'default', 'types'] },
    cache: { folder: 'node_modules/.cache/dependency-cruiser', strategy: 'content' },
  },
};
