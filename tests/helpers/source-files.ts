import { readFileSync, readdirSync } from 'node:fs'
import { dirname, join, posix, relative } from 'node:path'
import { fileURLToPath } from 'node:url'
import ts from 'typescript'

/** The checkout's top folder. */
export const ROOT = fileURLToPath(new URL('../..', import.meta.url))

/** A source file as rules see it: `path` from the top folder with forward slashes, and its script part parsed. */
export interface SourceFile {
  readonly path: string
  readonly text: string
  readonly tree: ts.SourceFile
}

/** One import, re-export or dynamic import. */
export interface ImportLine {
  readonly specifier: string
  readonly line: number
}

/** Where an import leads: a file of the project (its path may lack the ending), Node, or a package by name. */
export type Target =
  | { readonly kind: 'file'; readonly path: string; readonly isByAlias: boolean }
  | { readonly kind: 'node' | 'package'; readonly name: string }

const ALIASES = { '@shared/': 'shared/', '@server/': 'src-server/', '@/': 'src/' } as const

/** Every file under these folders whose name ends in one of the endings, in order of path. */
export function filePathsUnder(folders: readonly string[], endings: readonly string[]): string[] {
  return folders
    .flatMap((folder) => pathsUnder(join(ROOT, folder)))
    .filter((path) => endings.some((ending) => path.endsWith(ending)))
    .map((path) => relative(ROOT, path).replaceAll('\\', '/'))
    .sort()
}

function pathsUnder(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name)
    return entry.isDirectory() ? pathsUnder(path) : [path]
  })
}

export function readText(path: string): string {
  return readFileSync(join(ROOT, path), 'utf8')
}

/** Reads and parses a file; of a component only its scripts, with the line numbers kept. */
export function readSourceFile(path: string): SourceFile {
  return sourceFileFrom(path, readText(path))
}

export function sourceFileFrom(path: string, text: string): SourceFile {
  const script = path.endsWith('.vue') ? scriptOf(text) : text
  return {
    path,
    text,
    tree: ts.createSourceFile(path, script, ts.ScriptTarget.ES2023, true, ts.ScriptKind.TS),
  }
}

/** Blanks out everything but the inside of the script blocks. */
function scriptOf(component: string): string {
  const kept = [...component.matchAll(/<script\b[^>]*>([\s\S]*?)<\/script>/g)].map((match) => {
    const start = match.index + match[0].indexOf('>') + 1
    return { start, end: start + (match[1] ?? '').length }
  })
  return component.replaceAll(/[^\n]/g, (character, at: number) =>
    kept.some(({ start, end }) => at >= start && at < end) ? character : ' ',
  )
}

/** Calls `look` with every node of the tree. */
export function walk(node: ts.Node, look: (node: ts.Node) => void): void {
  look(node)
  node.forEachChild((child) => walk(child, look))
}

export function lineOf(file: SourceFile, node: ts.Node): number {
  return file.tree.getLineAndCharacterOfPosition(node.getStart(file.tree)).line + 1
}

/** Every import of a file, whether of values or of types. */
export function importsOf(file: SourceFile): ImportLine[] {
  const found: ImportLine[] = []
  walk(file.tree, (node) => {
    const specifier = specifierOf(node)
    if (specifier !== undefined) found.push({ specifier, line: lineOf(file, node) })
  })
  return found
}

function specifierOf(node: ts.Node): string | undefined {
  if (ts.isImportDeclaration(node) || ts.isExportDeclaration(node)) return textOf(node.moduleSpecifier)
  if (ts.isImportTypeNode(node))
    return ts.isLiteralTypeNode(node.argument) ? textOf(node.argument.literal) : ''
  if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) {
    return textOf(node.arguments[0]) ?? ''
  }
  return undefined
}

const textOf = (node: ts.Node | undefined) =>
  node !== undefined && ts.isStringLiteralLike(node) ? node.text : undefined

/** Where an import written in `fromPath` leads. */
export function targetOf(fromPath: string, specifier: string): Target {
  const [bare = ''] = specifier.split('?') // the build's own suffixes: ?url, ?worker
  if (bare.startsWith('.')) {
    return { kind: 'file', path: posix.normalize(posix.join(dirname(fromPath), bare)), isByAlias: false }
  }
  for (const [alias, folder] of Object.entries(ALIASES)) {
    if (bare.startsWith(alias))
      return { kind: 'file', path: folder + bare.slice(alias.length), isByAlias: true }
  }
  if (bare.startsWith('node:')) return { kind: 'node', name: bare.slice('node:'.length) }
  const parts = bare.split('/')
  return { kind: 'package', name: bare.startsWith('@') ? parts.slice(0, 2).join('/') : (parts[0] ?? '') }
}
