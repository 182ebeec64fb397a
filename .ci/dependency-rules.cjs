/** What may import what. Whatever stands on no line of `allowed` is refused, type imports too. */
const may = (from, to) => ({ from: { path: from }, to: { path: to } });
const npm = (...names) => `^node_modules/(${names.join('|')})/`;
const KERNEL = '^lib/kernel/';
const DOMAIN = '^lib/[^/]+/domain/';

module.exports = {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    { name: 'nothing-imports-tests', severity: 'error', from: { pathNot: '^tests/' }, to: { path: '^tests/' } },
    {
      name: 'oracle-stands-alone',
      comment: 'What judges the engine shares no line with it, not even a type.',
      severity: 'error',
      from: { path: '^tests/properties/oracle[.]ts$' },
      to: { pathNot: '^node_modules/' },
    },
  ],
  allowedSeverity: 'error',
  allowed: [
    may(KERNEL, [KERNEL, npm('use-intl', 'zod'), '^content/messages/']),
    may(DOMAIN, [KERNEL, DOMAIN, npm('diff', 'fuse.js', 'd3-[a-z]+')]),
    // Synonyms are data, and part of how words are read wherever they are read.
    may('^lib/search/domain/lexicon[.]ts$', '^content/words/synonyms[.]json$'),
    may('^content/', ['^content/', KERNEL, DOMAIN, '^lib/[^/]+/schema[.]ts$', npm('zod')]),
    may('^components/', [
      '^components/',
      KERNEL,
      DOMAIN,
      npm('next', 'react', 'react-dom', '@types/react', '@types/react-dom', 'swr', 'fuse.js', 'hast-util-to-jsx-runtime', 'd3-[a-z]+'),
    ]),
    may('^db/', ['^db/', KERNEL, DOMAIN, npm('knex', 'zod', 'server-only')]),
    { from: { path: '^(db|lib/server|scripts)/' }, to: { dependencyTypes: ['core'] } },
    may('^db/seeds/', '^content/seed/'),
    may('^lib/server/', ['^(lib/server|db|content)/', '^package[.]json$', KERNEL, DOMAIN, '^node_modules/']),
    // What the worker does is put together here, of every slice's use cases.
    may('^lib/server/work/(handlers|rounds)[.]ts$', '^lib/'),
    // A use case knows its own slice, never another slice's use cases: pages compose slices, slices do not.
    may('^lib/(?!kernel/|server/)([^/]+)/[^/]+[.]ts$', [
      '^lib/$1/',
      '^lib/server/',
      '^(db|content)/',
      KERNEL,
      DOMAIN,
      npm('zod', 'server-only', 'fflate'),
    ]),
    may('^app/', ['^(app|components|lib|content)/', npm('next', 'next-auth', 'react', '@types/react', 'swr', '@fontsource[^/]*/[^/]+')]),
    // Beside the folders stand settings of tools, proxy.ts and instrumentation.ts.
    may('^(tests|scripts|[.]ci)/|^[^/]+[.](ts|mjs)$', '.'),
  ],
  options: {
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^[.]next' },
    enhancedResolveOptions: { exportsFields: ['exports'], conditionNames: ['import', 'node', 'default', 'types'] },
  },
};
