/** Folder `from` must not import folder `to` (regular expressions on paths). */
const forbid = (name, from, to) => ({ name, severity: 'error', from: { path: from }, to });

module.exports = {
  forbidden: [
    forbid('client-not-to-server', '^(app|features)/', { path: '^(server|migrations)/' }),
    forbid('numerics-stays-pure', '^server/numerics/', { pathNot: '^server/numerics/' }),
    forbid('routes-thin', '^server/routes/', { path: '^server/(numerics|jobs)/' }),
    forbid('features-do-not-reach-sideways', '^features/([^/]+)/', {
      path: '^features/',
      // checking: the form of an orbit and its report, which the Bench and the Desk share.
      pathNot: '^features/($1|ui|notation|plot|api|checking)/',
    }),
    forbid('services-know-no-http', '^server/(services|models|jobs|numerics)/', {
      path: '^server/(routes|http)/|/express/',
    }),
    forbid('server-not-to-client', '^(server|migrations|schemas)/', { path: '^(app|features)/' }),
    forbid('models-are-leaves', '^server/models/', {
      path: '^server/(services|routes|jobs|presenters|numerics)/',
    }),
    // The program that writes the parser reads and writes files; nothing imports it.
    forbid('checks-are-pure', '^server/(checks|systems|formulas)/(?!generate-parser)', {
      pathNot: '^server/(checks|systems|formulas|numerics)/|^schemas/generated/|/peggy/',
    }),
    forbid('api-draws-nothing', '^features/api/', { path: '^features/(?!api/)' }),
    forbid('ui-knows-no-domain', '^features/ui/', { path: '^(features/(?!ui/)|schemas/)' }),
    forbid('app-holds-no-logic', '^app/', { path: '^(schemas|features/api)/' }),
    forbid('routes-only-in-app', '^features/', { path: '^app/' }),
    forbid('setup-needs-no-package', '^server/setup/(?!start).*\\.mjs$', {
      pathNot: '^server/setup/.*\\.mjs$|^node:|^[a-z_]+$',
    }),
    forbid('no-cycles', '', { circular: true }),
  ],
  options: {
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    doNotFollow: { path: 'node_modules' },
  },
};
