/** The arrows of the house: a build fails when one turns round. See DEVELOPERS.md. */
const only = (name, from, allowed) => ({
  name,
  severity: 'error',
  from: { path: from, pathNot: '\\.test\\.tsx?$' },
  to: { path: '.', pathNot: allowed, dependencyTypesNot: ['type-only'] },
});
module.exports = {
  forbidden: [
    { name: 'no-circular', severity: 'error', from: {}, to: { circular: true } },
    only('units-import-nothing', '^app/units/', ['^app/units/']),
    only('air-imports-air-and-units', '^app/air/', ['^app/(air|units)/']),
    only('loads-import-loads-and-units', '^app/loads/', ['^app/(loads|units)/']),
    {
      name: 'models-import-no-layer-above',
      severity: 'error',
      from: { path: '^app/models/' },
      to: { path: '^app/(routes|commands|queries|components|fill|services)/' },
    },
    {
      name: 'writes-and-reads-know-no-routes',
      severity: 'error',
      from: { path: '^app/(commands|queries|services)/' },
      to: { path: '^app/(routes|components)/' },
    },
    {
      name: 'phone-knows-no-server',
      severity: 'error',
      from: { path: '^app/(fill|components)/', pathNot: '\\.test\\.tsx?$' },
      to: {
        path: '^app/(models|commands|queries|services|routes)/|\\.server\\.tsx?$',
        dependencyTypesNot: ['type-only'],
      },
    },
    {
      name: 'routes-hold-no-orm',
      severity: 'error',
      from: { path: '^app/routes/' },
      to: { path: '^app/models/|node_modules/(sequelize|pg)/', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'app-imports-nothing-beside-it',
      severity: 'error',
      from: { path: '^app/', pathNot: '\\.test\\.tsx?$' },
      to: { path: '^(bench|db|e2e|tests)/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '\\+types' },
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};
