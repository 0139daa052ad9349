import { existsSync } from 'node:fs'
import { basename } from 'node:path'
import { describe, expect, it } from 'vitest'
import { ROOT, filePathsUnder, readText } from '../helpers/source-files'

const LINES_AT_MOST = 400
const FOLDERS = ['src', 'src-server', 'shared', 'examples', 'tests']
const paths = filePathsUnder(FOLDERS, ['.ts', '.vue', '.mjs', '.sass', '.scss', '.css'])
const productPaths = paths.filter((path) => !path.startsWith('tests/'))

/** The files that DEVELOPERS.md lists, each with its reason, under the heading "Longer files". */
function longerFilesIn(developers: string): string[] {
  const section = /^#+ Longer files\n([\s\S]*?)(?=^#+ |$(?![\s\S]))/m.exec(developers)?.[1] ?? ''
  return [...section.matchAll(/^- `([^`]+)`: \S/gm)].map((match) => match[1] ?? '')
}

const linesOf = (text: string) => text.split('\n').length - 1

/** Words for work left undone or checks switched off; put together here so that this file is clean of them. */
const LEFT_UNDONE = new RegExp(
  [
    'TO' + 'DO',
    'FIX' + 'ME',
    'HA' + 'CK',
    'XX' + 'X',
    '@ts-' + '(ignore|nocheck|expect-error)',
    'eslint-' + 'disable',
  ]
    .map((word) => `\\b${word}\\b`)
    .join('|')
    .replaceAll('\\b@', '@'),
)

const NAMELESS = /(^|-)(utils?|helpers?|common|misc)$|^managers?$/i

function nameFaultOf(path: string): string | undefined {
  const segments = path.replace(/\.d\.ts$|\.[a-z]+$/, '').split('/')
  if (segments.some((segment) => NAMELESS.test(segment))) return `${path}: has a name for anything`
  const name = basename(path)
  if (path.endsWith('.vue')) {
    const isComponent = name === 'App.vue' || /^([A-Z][a-z0-9]+){2,}\.vue$/.test(name)
    return isComponent ? undefined : `${path}: a component’s name is two words or more in PascalCase`
  }
  return /^[a-z0-9]+(-[a-z0-9]+)*(\.d)?\.[a-z]+$/.test(name)
    ? undefined
    : `${path}: a file’s name is kebab-case`
}

describe('the project', () => {
  it('has no file that is too long, but for those listed with a reason', () => {
    const developers = existsSync(`${ROOT}/DEVELOPERS.md`) ? readText('DEVELOPERS.md') : ''
    const tooLong = paths.filter((path) => linesOf(readText(path)) > LINES_AT_MOST)
    expect(tooLong).toEqual(longerFilesIn(developers).sort())
  })

  it('leaves nothing undone and no check switched off', () => {
    expect(paths.filter((path) => LEFT_UNDONE.test(readText(path)))).toEqual([])
  })

  it('names its files for what they hold', () => {
    expect(productPaths.flatMap((path) => nameFaultOf(path) ?? [])).toEqual([])
  })
})

describe('the rules themselves', () => {
  it('read the list of longer files from its own section', () => {
    const developers = `# Map\n- \`shared/a.ts\`: not here\n## Longer files\n- \`shared/b.ts\`: one table\n- \`src/c.ts\`: \n## Next\n- \`src/d.ts\`: no\n`
    expect(longerFilesIn(developers)).toEqual(['shared/b.ts'])
    expect(longerFilesIn('## Longer files\n- `x.ts`: last section')).toEqual(['x.ts'])
    expect(longerFilesIn('')).toEqual([])
  })

  it.each([
    '// TO' + 'DO later',
    '/* FIX' + 'ME */',
    '// @ts-' + 'ignore',
    '// eslint-' + 'disable-next-line',
  ])('find %s', (text) => expect(text).toMatch(LEFT_UNDONE))

  it.each([
    'shared/units/utils.ts',
    'src/board/snap-helpers.ts',
    'src/components/Board.vue',
    'src/api/IssueApi.ts',
  ])('refuse the name %s', (path) => expect(nameFaultOf(path)).toContain(path))

  it.each(['src-server/setup/first-manager.ts', 'src/components/board/MemberTable.vue', 'src/App.vue'])(
    'let the name %s be',
    (path) => expect(nameFaultOf(path)).toBeUndefined(),
  )
})
