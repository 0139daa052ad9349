/**
 * The command line: `npm run --silent compute -- FILE.json …`. Everything that can be computed from a commission file,
 * as JSON on standard output. Exit status 2 and every fault on standard error when anything is wrong; then nothing is
 * printed and no file is written.
 */
import { rename, readFile, rm, writeFile } from 'node:fs/promises'
import { dirname, join, basename } from 'node:path'
import { parseArgs } from 'node:util'
import { answerOf, sheetFilesOf } from '@shared/answer'
import type { SheetFormat } from '@shared/answer'
import { commissionAnswerJsonSchema, commissionFileJsonSchema, readCommissionText } from '@shared/contracts'
import type { CommissionFile } from '@shared/contracts'
import { Failure } from '@shared/failure'
import type { Fault } from '@shared/failure'
import { readSheetFonts } from './files/sheet-fonts'

const USAGE = `Usage:
  npm run --silent compute -- FILE.json [FILE.json …]
  npm run --silent compute -- FILE.json [--sheet OUT.pdf] [--dxf OUT.dxf] [--svg OUT.svg]
  npm run --silent compute -- --schema [in|out]
`
const FORMATS: readonly SheetFormat[] = ['sheet', 'dxf', 'svg']

/** What was asked for is wrong: the lines for standard error. */
class Refusal extends Error {
  constructor(readonly lines: readonly string[]) {
    super(lines.join('\n'))
  }
}

const lineOf = (file: string, fault: Fault) =>
  `${file}: ${fault.path === '' ? '/' : fault.path} ${fault.says}`

interface Request {
  readonly files: readonly string[]
  readonly schema: 'in' | 'out' | undefined
  readonly outputs: ReadonlyMap<SheetFormat, string>
}

function requestFrom(args: readonly string[]): Request {
  const { values, positionals } = parsed(args)
  const outputs = new Map<SheetFormat, string>()
  for (const format of FORMATS) {
    const path = values[format]
    if (path !== undefined) outputs.set(format, path)
  }
  if (values.schema) {
    const [which = 'in', ...rest] = positionals
    if ((which !== 'in' && which !== 'out') || rest.length > 0 || outputs.size > 0) throw new Refusal([USAGE])
    return { files: [], schema: which, outputs }
  }
  if (positionals.length === 0) throw new Refusal([USAGE])
  if (outputs.size > 0 && positionals.length > 1) {
    throw new Refusal(['--sheet, --dxf and --svg take one file; give a single FILE.json.'])
  }
  return { files: positionals, schema: undefined, outputs }
}

function parsed(args: readonly string[]) {
  try {
    const text = { type: 'string' } as const
    const options = { schema: { type: 'boolean' }, sheet: text, dxf: text, svg: text } as const
    return parseArgs({ args: [...args], options, allowPositionals: true })
  } catch (error) {
    if (!(error instanceof TypeError)) throw error
    throw new Refusal([error.message, USAGE])
  }
}

async function commissionFrom(path: string): Promise<CommissionFile> {
  const bytes = await readFile(path).catch((error: NodeJS.ErrnoException) => {
    throw new Refusal([`${path}: cannot be read (${error.code ?? error.message}).`])
  })
  const reading = readCommissionText(bytes.toString('utf8'), bytes.length)
  if (reading.kind === 'refused') throw new Refusal(reading.faults.map((fault) => lineOf(path, fault)))
  return reading.file
}

/** All or nothing: every file is answered before anything is said. */
async function answersTo(
  files: readonly string[],
): Promise<{ commission: CommissionFile; answer: object }[]> {
  const answers: { commission: CommissionFile; answer: object }[] = []
  const lines: string[] = []
  for (const path of files) {
    try {
      const commission = await commissionFrom(path)
      answers.push({ commission, answer: answerOf(commission) })
    } catch (error) {
      lines.push(...linesOf(path, error))
    }
  }
  if (lines.length > 0) throw new Refusal(lines)
  return answers
}

function linesOf(path: string, error: unknown): readonly string[] {
  if (error instanceof Refusal) return error.lines
  if (!(error instanceof Failure)) throw error
  const faults = error.details.faults ?? []
  return faults.length > 0 ? faults.map((fault) => lineOf(path, fault)) : [`${path}: ${error.message}`]
}

/** Written beside its place and moved there when whole, so that no file is ever left half written. */
async function writeWhole(files: ReadonlyMap<string, Uint8Array | string>): Promise<void> {
  const moves: { from: string; to: string }[] = []
  try {
    for (const [path, content] of files) {
      const from = join(dirname(path), `.${basename(path)}.${process.pid}.part`)
      moves.push({ from, to: path })
      await writeFile(from, content)
    }
    for (const { from, to } of moves) await rename(from, to)
  } catch (error) {
    await Promise.all(moves.map(({ from }) => rm(from, { force: true })))
    const { code, message, path } = error as NodeJS.ErrnoException
    if (code === undefined) throw error
    throw new Refusal([`${path ?? 'output'}: cannot be written (${message}).`])
  }
}

async function run(args: readonly string[]): Promise<string> {
  const request = requestFrom(args)
  if (request.schema !== undefined) {
    return JSON.stringify(
      request.schema === 'in' ? commissionFileJsonSchema() : commissionAnswerJsonSchema(),
      null,
      2,
    )
  }
  const answers = await answersTo(request.files)
  const [first] = answers
  if (request.outputs.size > 0 && first !== undefined) {
    const made = await sheetFilesOf(first.commission, [...request.outputs.keys()], await readSheetFonts())
    const files = new Map([...request.outputs].map(([format, path]) => [path, made[format] ?? ''] as const))
    await writeWhole(files)
  }
  const objects = answers.map(({ answer }) => answer)
  return JSON.stringify(objects.length === 1 ? objects[0] : objects, null, 2)
}

try {
  const output = await run(process.argv.slice(2))
  process.stdout.write(output + '\n')
} catch (error) {
  if (error instanceof Refusal || error instanceof Failure) {
    const lines = error instanceof Refusal ? error.lines : linesOf('compute', error)
    process.stderr.write(lines.join('\n') + '\n')
    process.exitCode = 2
  } else {
    throw error
  }
}
