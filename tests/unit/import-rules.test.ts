import ts from 'typescript'
import { describe, expect, it } from 'vitest'
import { importFault } from '../helpers/import-table'
import {
  filePathsUnder,
  importsOf,
  lineOf,
  readSourceFile,
  sourceFileFrom,
  walk,
} from '../helpers/source-files'
import type { SourceFile } from '../helpers/source-files'

const paths = filePathsUnder(['src', 'src-server', 'shared', 'examples', 'tests'], ['.ts', '.vue'])
const files = paths.filter((path) => !path.endsWith('.d.ts')).map(readSourceFile)
const productFiles = files.filter(({ path }) => !path.startsWith('tests/'))
const sharedFiles = files.filter(({ path }) => path.startsWith('shared/'))

function importFaultsOf(file: SourceFile): string[] {
  return importsOf(file).flatMap(({ specifier, line }) => {
    const fault = importFault(file.path, specifier)
    return fault === undefined ? [] : [`${file.path}:${line} imports '${specifier}': ${fault}`]
  })
}

/** Places where a value would depend on the moment or on chance: those come in as arguments. */
function clockAndChanceIn(file: SourceFile): string[] {
  const found: string[] = []
  const enter = (node: ts.Node, what: string) => found.push(`${file.path}:${lineOf(file, node)} ${what}`)
  walk(file.tree, (node) => {
    if (ts.isPropertyAccessExpression(node)) {
      const text = node.getText(file.tree)
      if (['Date.now', 'Math.random', 'performance.now'].includes(text)) enter(node, text)
    }
    const makesDate =
      (ts.isNewExpression(node) || ts.isCallExpression(node)) &&
      node.expression.getText(file.tree) === 'Date' &&
      (ts.isCallExpression(node) || (node.arguments ?? []).length === 0)
    if (makesDate) enter(node, 'the present moment')
  })
  return found
}

function starExportsIn(file: SourceFile): string[] {
  return file.tree.statements
    .filter((statement) => ts.isExportDeclaration(statement) && !hasNames(statement))
    .map((statement) => `${file.path}:${lineOf(file, statement)} export *`)
}

const hasNames = ({ exportClause }: ts.ExportDeclaration) =>
  exportClause !== undefined && ts.isNamedExports(exportClause)

describe('the project', () => {
  it('imports only as the table allows', () => {
    expect(files.flatMap(importFaultsOf)).toEqual([])
  })

  it('keeps clock and chance out of the shared code', () => {
    expect(sharedFiles.flatMap(clockAndChanceIn)).toEqual([])
  })

  it('names what it exports, one by one', () => {
    expect(productFiles.flatMap(starExportsIn)).toEqual([])
  })

  it('has an index at the root of a shared folder and nowhere else', () => {
    const indexes = sharedFiles.map(({ path }) => path).filter((path) => path.endsWith('/index.ts'))
    expect(indexes.filter((path) => !/^shared\/[a-z]+\/index\.ts$/.test(path))).toEqual([])
  })

  it('calls fetch in src/api alone', () => {
    const calls = files
      .filter(({ path }) => path.startsWith('src/') && !path.startsWith('src/api/'))
      .filter(({ tree }) => callsOf(tree).includes('fetch'))
    expect(calls.map(({ path }) => path)).toEqual([])
  })
})

function callsOf(tree: ts.SourceFile): string[] {
  const names: string[] = []
  walk(tree, (node) => {
    if (ts.isCallExpression(node))
      names.push(node.expression.getText(tree).replace(/^(window|globalThis)\./, ''))
  })
  return names
}

describe('the import table', () => {
  it.each([
    ['shared/geometry/arc.ts', '@shared/section', 'may not import'],
    ['shared/timber/mass.ts', '@shared/finish', 'may not import'],
    ['shared/section/faces.ts', '@shared/geometry/arc', 'only by its folder'],
    ['shared/section/faces.ts', '../geometry', '@shared/…'],
    ['shared/section/faces.ts', '@shared/section', './file'],
    ['shared/geometry/arc.ts', 'clipper-lib', 'package'],
    ['shared/units/length.ts', 'zod', 'zod'],
    ['shared/units/length.ts', 'node:fs', 'Node'],
    ['shared/access/rights.ts', '@shared/contracts', 'may not import'],
    ['src/board/tool.ts', 'vue', 'package'],
    ['src/board/tool.ts', '@/stores/session', 'may not import'],
    ['src/api/issues.ts', '@/stores/session', 'may not import'],
    ['src/stores/session.ts', '@/pages/SignInPage.vue', 'may not import'],
    ['src/components/review/RemarkList.vue', '@/api/issues', 'may not import'],
    ['src/components/review/RemarkList.vue', '../../api/issues', 'may not import'],
    ['src/components/review/RemarkList.vue', '@/pages/IssuePage.vue', 'may not import'],
    ['src/main.ts', '@server/app', 'may not import'],
    ['src-server/routes/issues.ts', '../models/issue', 'may not import'],
    ['src-server/routes/issues.ts', 'sequelize', 'package'],
    ['src-server/services/decide.ts', '../routes/issues', 'may not import'],
    ['src-server/services/decide.ts', 'express', 'package'],
    ['src-server/services/decide.ts', '../mail/transport', 'may not import'],
    ['src-server/presenters/issue.ts', '../services/decide', 'may not import'],
    ['src-server/migrations/20261201-1200-add-x.ts', '../models/issue', 'may not import'],
    ['src-server/app.ts', '@/main', 'may not import'],
    ['tests/api/issues.test.ts', '@server/services/decide', 'may not import'],
    ['tests/e2e/journey.test.ts', '@server/models/issue', 'may not import'],
    ['tests/unit/units/length.test.ts', '@shared/units/length', 'index'],
    ['src-server/services/decide.ts', 'zod', 'zod'],
    ['shared/novelty/x.ts', './y', 'no row'],
  ])('refuses %s importing %s', (from, specifier, says) => {
    expect(importFault(from, specifier)).toContain(says)
  })

  it.each([
    ['shared/sheet/layout.ts', '@shared/geometry'],
    ['shared/geometry/polygons.ts', 'clipper-lib'],
    ['shared/section/digest.ts', '@noble/hashes/sha2.js'],
    ['shared/contracts/scalars.ts', 'zod'],
    ['src/board/scope.ts', 'paper/dist/paper-core.js'],
    ['src/pages/IssuePage.vue', '@/components/review/RemarkList.vue'],
    ['src/composables/use-board.ts', '@/board/tool'],
    ['src-server/services/decide.ts', '../mail/outbox'],
    ['src-server/services/decide.ts', './transaction'],
    ['src-server/main.ts', './app'],
    ['tests/api/issues.test.ts', '../helpers/client'],
  ])('lets %s import %s', (from, specifier) => {
    expect(importFault(from, specifier)).toBeUndefined()
  })
})

describe('the reading of a source', () => {
  it('finds every way to import', () => {
    const text = `import a from 'a'
      import type { B } from 'b'
      export { c } from 'c'
      const d = await import('d')
      type E = import('e').E
      // import f from 'f'
      const g = "import h from 'h'"`
    expect(importsOf(sourceFileFrom('x.ts', text)).map(({ specifier }) => specifier)).toEqual([
      'a',
      'b',
      'c',
      'd',
      'e',
    ])
  })

  it('reads the scripts of a component, with its own line numbers', () => {
    const text = `<template>\n  <p>import x from 'x'</p>\n</template>\n<script setup lang="ts">\nimport a from 'a'\n</script>\n`
    expect(importsOf(sourceFileFrom('x.vue', text))).toEqual([{ specifier: 'a', line: 5 }])
  })

  it('finds the clock and chance, and lets a given moment be', () => {
    const text =
      'new Date(); Date(); Date.now(); Math.random(); performance.now(); new Date(2026, 1, 1); Date.UTC(1)'
    expect(clockAndChanceIn(sourceFileFrom('shared/x.ts', text))).toHaveLength(5)
  })

  it('finds a star export, named or not', () => {
    const text = "export * from 'a'\nexport * as b from 'b'\nexport { c } from 'c'\nexport const d = 1"
    expect(starExportsIn(sourceFileFrom('x.ts', text))).toHaveLength(2)
  })
})
