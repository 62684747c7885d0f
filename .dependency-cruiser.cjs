/** The walls of the house: see docs/architecture.md. Each rule here has a planted offence in apps/run/walls.spec.ts. */
const onlyInto = (room, allowed) => ({
  name: `${room}-imports-only-what-it-may`,
  severity: 'error',
  from: { path: `^libs/${room}/`, pathNot: '\\.spec\\.ts$' },
  to: { path: '^(apps|libs|shared|mocks)/', pathNot: [`^libs/${room}/`, ...allowed.map((a) => `^${a}/`)] },
});
module.exports = {
  forbidden: [
    { name: 'no-circular', severity: 'error', from: {}, to: { circular: true } },
    onlyInto('quantities', []),
    onlyInto('money', []),
    onlyInto('measurement', []),
    onlyInto('control-charts', []),
    onlyInto('logger-files', []),
    onlyInto('core-loss', ['libs/quantities', 'libs/measurement']),
    onlyInto('winding', ['libs/quantities', 'libs/measurement']),
    onlyInto('machine-tests', ['libs/quantities', 'libs/measurement']),
    onlyInto('drawings', ['libs/quantities', 'libs/measurement', 'libs/core-loss']),
    onlyInto('documents', ['libs/[^/]+', 'shared']),
    {
      name: 'a-library-has-one-door',
      severity: 'error',
      from: { path: '^(apps|shared|mocks)/' },
      to: { path: '^libs/[^/]+/src/', pathNot: '/src/index\\.ts$' },
    },
    {
      name: 'a-library-has-one-door-for-its-sisters',
      severity: 'error',
      from: { path: '^libs/([^/]+)/' },
      to: { path: '^libs/(?!$1/)[^/]+/src/', pathNot: '/src/index\\.ts$' },
    },
    { name: 'libs-are-pure', severity: 'error', from: { path: '^libs/', pathNot: '\\.spec\\.ts$' }, to: { path: '^node_modules/(@nestjs|react|typeorm|better-sqlite3|stripe|nodemailer)' } },
    { name: 'shared-is-the-contract', severity: 'error', from: { path: '^shared/' }, to: { path: '^(apps|mocks)/|node_modules/(@nestjs|react|typeorm)' } },
    { name: 'web-not-api', severity: 'error', from: { path: '^apps/web/src/' }, to: { path: '^(apps/api|mocks)/' } },
    { name: 'api-not-web', severity: 'error', from: { path: '^apps/api' }, to: { path: '^apps/web/' } },
    { name: 'mocks-stay-outside', severity: 'error', from: { path: '^(apps/(api|web)/src|libs|shared)/', pathNot: '\\.spec\\.tsx?$' }, to: { path: '^mocks/' } },
    { name: 'web-components-know-no-feature', severity: 'error', from: { path: '^apps/web/src/(components|lib)/' }, to: { path: '^apps/web/src/(features|app)/' } },
    {
      name: 'web-features-stand-apart',
      severity: 'error',
      from: { path: '^apps/web/src/features/([^/]+)/' },
      to: { path: '^apps/web/src/(features/(?!$1/)|app/)' },
    },
  ],
  options: {
    tsConfig: { fileName: 'tsconfig.base.json' },
    tsPreCompilationDeps: true,
    doNotFollow: { path: 'node_modules' },
    exclude: '^(dist|coverage|data)/',
  },
};
