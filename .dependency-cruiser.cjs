/** Holds the layer table of DEVELOPERS.md for TypeScript files; eslint.config.mjs does it for Astro files. */
const forbid = (name, from, to, comment) => ({
  name,
  severity: 'error',
  comment,
  from: { path: from },
  to: { path: to },
});

/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    forbid(
      'domain-is-pure',
      '^src/domain',
      '^(src/(server|components|layouts|pages)|db)/',
      'Rules take data and return data.',
    ),
    forbid('db-holds-data', '^db', '^src/(?!domain)', 'Rules and permissions live elsewhere.'),
    forbid(
      'server-knows-no-screens',
      '^src/server',
      '^src/(components|layouts|pages)',
      'Use cases are called by pages.',
    ),
    forbid(
      'components-know-no-server',
      '^src/components',
      '^(src/(server|layouts|pages)|db)/',
      'Data comes through the API or props.',
    ),
    forbid('ui-knows-no-domain', '^src/components/ui', '^src/(?!components/ui)', 'Plain parts carry no domain words.'),
    {
      name: 'areas-keep-apart',
      severity: 'error',
      comment:
        'sheet, threads, photos and worksheets are shown by other areas, api calls the server; all else is private to its area.',
      from: { path: '^src/components/([^/]+)/', pathNot: '^src/components/ui/' },
      to: {
        path: '^src/components/',
        pathNot: ['^src/components/$1/', '^src/components/(ui|api|sheet|threads|photos|worksheets)/'],
      },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    exclude: { path: '(\\.astro$|^dist|astro:)' },
  },
};
