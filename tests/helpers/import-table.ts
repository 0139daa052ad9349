import { targetOf } from './source-files'
import type { Target } from './source-files'

/**
 * Who may import whom, as DEVELOPERS.md shows it: the first row whose `of` matches a file's path rules it.
 * `may` and `packages` are what it may reach besides its own folder.
 */
interface Row {
  readonly of: RegExp
  readonly may: readonly RegExp[]
  readonly packages: readonly string[] | 'any'
  readonly node?: boolean
}

const shared = (...folders: readonly string[]) => new RegExp(`^shared/(${folders.join('|')})$`)
const anyShared = /^shared\/[a-z]+$/
const src = (...folders: readonly string[]) => new RegExp(`^src/(${folders.join('|')})(/|$)`)
const server = (...names: readonly string[]) => new RegExp(`^src-server/(${names.join('|')})(/|$)`)

/** The chain of the shared folders: each may use those of the groups before its own. */
const CHAIN = [
  ['failure'],
  ['units'],
  ['geometry'],
  ['section'],
  ['knife', 'timber', 'photo', 'finish'],
  ['cutting'],
  ['sheet'],
] as const

const chainRows: readonly Row[] = CHAIN.flatMap((group, place) =>
  group.map((folder) => ({
    of: new RegExp(`^shared/${folder}/`),
    may: [shared(...CHAIN.slice(0, place).flat())],
    packages: [],
  })),
)

/** The one file of a shared folder that may hold a package. */
const packageHolders: Readonly<Record<string, string>> = {
  'shared/geometry/polygons.ts': 'clipper-lib',
  'shared/section/digest.ts': '@noble/hashes',
  'shared/sheet/pdf.ts': 'jspdf',
}

const VUE = ['vue', 'vue-router', 'pinia', 'quasar', '@quasar/extras', '@tanstack/vue-query', '@vueuse/core']

const ROWS: readonly Row[] = [
  ...chainRows,
  { of: /^shared\/access\//, may: [shared('units', 'failure')], packages: [] },
  { of: /^shared\/course\//, may: [shared('units', 'failure')], packages: [] },
  { of: /^shared\/contracts\//, may: [anyShared], packages: ['zod'] },
  { of: /^shared\/answer\//, may: [anyShared], packages: [] },

  { of: /^src\/board\//, may: [anyShared], packages: ['paper'] },
  { of: /^src\/api\//, may: [shared('contracts', 'failure')], packages: [] },
  {
    of: /^src\/(stores|composables)\//,
    may: [src('api', 'board', 'stores', 'composables'), anyShared],
    packages: [...VUE, 'uuid'],
  },
  { of: /^src\/components\//, may: [src('composables', 'stores'), anyShared], packages: VUE },
  {
    of: /^src\/(pages|layouts)\//,
    may: [src('composables', 'stores', 'components', 'pages', 'layouts'), anyShared],
    packages: VUE,
  },
  { of: /^src\//, may: [/^src\//, anyShared], packages: 'any' },

  {
    of: /^src-server\/routes\//,
    may: [
      server('middleware', 'services', 'presenters', 'files/file-answer'),
      shared('contracts', 'access', 'failure'),
    ],
    packages: ['express', 'multer'],
    node: true,
  },
  {
    of: /^src-server\/services\//,
    may: [
      server('models', 'mail/(outbox|reading)', 'mail/letters[a-z-]*', 'files', 'migrations/migrator'),
      anyShared,
    ],
    packages: ['sequelize', 'argon2', 'sharp', 'uuid', 'jsonwebtoken'],
    node: true,
  },
  { of: /^src-server\/presenters\//, may: [server('models'), anyShared], packages: [] },
  { of: /^src-server\/migrations\//, may: [], packages: ['sequelize', 'umzug'] },
  { of: /^src-server\/models\//, may: [anyShared], packages: ['sequelize', 'mariadb', 'uuid'], node: true },
  { of: /^src-server\/files\//, may: [server('models'), anyShared], packages: 'any', node: true },
  {
    of: /^src-server\/(middleware|mail|seeds)\//,
    may: [server('models', 'services', 'files', 'mail', 'config', 'routes/route'), anyShared],
    packages: 'any',
    node: true,
  },
  { of: /^src-server\//, may: [/^src-server\//, anyShared], packages: 'any', node: true },

  { of: /^examples\//, may: [anyShared], packages: [], node: true },
  {
    of: /^tests\/api\//,
    may: [
      /^tests\/helpers\//,
      server('app', 'config', 'models', 'migrations', 'routes', 'mail/worker', 'services/running-worker'),
      anyShared,
    ],
    packages: 'any',
    node: true,
  },
  { of: /^tests\/e2e\//, may: [/^tests\/helpers\//, anyShared], packages: 'any', node: true },
  { of: /^tests\//, may: [/^tests\//, /^src\//, /^src-server\//, anyShared], packages: 'any', node: true },
]

/** Packages that one place holds for all: zod describes what comes from outside, and nothing else does. */
const ZOD_HOLDERS = /^(shared\/contracts\/|src-server\/config\.ts$|tests\/)/

/** What is wrong with this import, in words, or undefined. */
export function importFault(fromPath: string, specifier: string): string | undefined {
  const row = ROWS.find(({ of }) => of.test(fromPath))
  if (row === undefined) return `${fromPath} has no row in the import table`
  const target = targetOf(fromPath, specifier)
  switch (target.kind) {
    case 'node':
      return row.node === true ? undefined : `Node's ${target.name} is not for ${folderOf(fromPath)}`
    case 'package':
      return packageFault(fromPath, row, target.name)
    default:
      return fileFault(fromPath, row, target)
  }
}

function packageFault(fromPath: string, row: Row, name: string): string | undefined {
  if (name === 'zod' && !ZOD_HOLDERS.test(fromPath))
    return 'zod is for shared/contracts and src-server/config.ts'
  if (row.packages === 'any' || row.packages.includes(name) || packageHolders[fromPath] === name)
    return undefined
  return `the package ${name} is not for ${fromPath}`
}

function fileFault(fromPath: string, row: Row, target: Target & { kind: 'file' }): string | undefined {
  const { path, isByAlias } = target
  const home = folderOf(fromPath)
  if (path === home || path.startsWith(`${home}/`)) {
    return home.startsWith('shared/') && isByAlias ? 'a sibling is imported by ./file' : undefined
  }
  if (path.startsWith('shared/')) {
    if (!isByAlias) return `${path} is imported by @shared/…`
    if (!anyShared.test(path)) return `${path} is reached only by its folder's index`
  }
  return row.may.some((may) => may.test(path)) ? undefined : `${home} may not import ${path}`
}

/** shared/units, src/board, src-server/routes, tests/helpers; src or src-server for what lies at their top. */
function folderOf(path: string): string {
  const [top = '', next = ''] = path.split('/')
  return path.split('/').length > 2 ? `${top}/${next}` : top
}
