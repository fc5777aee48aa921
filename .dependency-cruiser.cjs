/** Who may import whom. Type imports count: a lower layer that needs an upper one's type is upside down. */
const pure = '^lib/(acoustics|tuning|listening|staging|advance)/'
const plotsCore = '^plots/(geometry|model|symbols|render|tools)/'

const rule = (name, from, to, comment) => ({ name, severity: 'error', comment, from, to })

module.exports = {
  forbidden: [
    rule('no-cycles', {}, { circular: true }, 'A circle has no lower layer.'),
    rule('acoustics-is-lowest', { path: '^lib/acoustics/' }, { path: '^(app|components|db|lib|plots)/', pathNot: '^lib/(acoustics/|errors)' }, 'acoustics imports nothing of ours'),
    rule('tuning-on-acoustics', { path: '^lib/tuning/' }, { path: '^(app|components|db|lib|plots)/', pathNot: '^lib/(acoustics/|tuning/|errors)' }, 'tuning rests on acoustics'),
    rule('listening-on-acoustics', { path: '^lib/listening/' }, { path: '^(app|components|db|lib|plots)/', pathNot: '^lib/(acoustics/|listening/|errors)' }, 'listening rests on acoustics'),
    rule('advance-on-tuning', { path: '^lib/advance/' }, { path: '^(app|components|db|lib|plots)/', pathNot: '^(lib/(acoustics/|tuning/|staging/|advance/|errors)|plots/(geometry|model|symbols|render)/)' }, 'advance rests on tuning and on the plot’s model'),
    rule('pure-has-no-framework', { path: [pure, plotsCore] }, { path: '^node_modules/(react|react-dom|next|drizzle-orm|pg|@tanstack)/' }, 'the trade’s rules run anywhere'),
    rule('geometry-is-lowest', { path: '^plots/geometry/' }, { path: '^(app|components|db|lib|plots)/', pathNot: '^plots/geometry/' }, 'geometry imports nothing of ours'),
    rule('model-on-geometry', { path: '^plots/model/' }, { path: '^(app|components|db|lib|plots)/', pathNot: '^plots/(geometry|model)/' }, 'the model rests on geometry'),
    rule('plots-core-is-pure', { path: plotsCore }, { path: '^(app|components|db|lib|plots/editor|plots/index)', pathNot: '^lib/(acoustics|tuning)/' }, 'drawing needs no data layer'),
    rule('contracts-on-pure', { path: '^lib/contracts/' }, { path: '^(app|components|db|lib|plots)/', pathNot: ['^lib/contracts/', pure, '^plots/(geometry|model|symbols)/', '^lib/errors'] }, 'a contract knows the rules, not the storage'),
    rule('db-on-contracts', { path: '^db/(schema|queries|client|migrate)' }, { path: '^(app|components|lib|plots)/', pathNot: ['^lib/(contracts/|env|errors)', pure] }, 'storage knows contracts only'),
    rule('queries-only-from-server', { path: '^(app|components|lib/client|lib/contracts|plots)/' }, { path: '^db/' }, 'only use cases read the database'),
    rule('server-stays-below', { path: '^lib/server/' }, { path: '^(app|components|lib/client|plots/editor|plots/index)' }, 'use cases know no screen'),
    rule('client-without-server', { path: '^lib/client/' }, { path: '^(app|components|db|lib/server|plots/editor|plots/index|plots/render|plots/tools)' }, 'hooks reach the server through HTTP'),
    rule('editor', { path: '^plots/editor/' }, { path: '^(app|db|lib/server|components/(?!ui/))' }, 'the editor draws with ui parts'),
    rule('components', { path: '^components/' }, { path: ['^(app|db|lib/server)/', '^plots/(?!index)'] }, 'components get their data handed in or by hooks'),
    rule('ui-knows-no-trade', { path: '^components/ui/' }, { path: '^(app|db|lib|plots|components/(?!ui/))' }, 'ui has no data and no trade words'),
    rule('app-through-barrel', { path: '^app/' }, { path: '^plots/(?!index)' }, 'the app sees plots through its index'),
    rule('nobody-imports-app', { pathNot: '^app/' }, { path: '^app/' }, 'the app is the top'),
    rule('tests-stay-outside', { pathNot: ['^tests/', '\\.test\\.tsx?$'] }, { path: ['^tests/', '\\.test\\.tsx?$'] }, 'no product code needs a test'),
    rule('resolvable', {}, { couldNotResolve: true }, 'every import exists'),
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)(\\.next|\\.local|node_modules/\\.cache)' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: { exportsFields: ['exports'], conditionNames: ['import', 'require', 'node', 'default', 'types'] },
  },
}
