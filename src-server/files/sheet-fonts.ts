import { readFile } from 'node:fs/promises'
import { createRequire } from 'node:module'

/** Work Sans as base64 TrueType, embedded in every PDF. */
export interface SheetFontFiles {
  readonly regular: string
  readonly semibold: string
}

const require = createRequire(import.meta.url)
const read = async (name: string) =>
  (await readFile(require.resolve(`@expo-google-fonts/work-sans/${name}`))).toString('base64')

let fonts: Promise<SheetFontFiles> | undefined

/** The fonts, read once per process: they ship with the application and never change under it. */
export function readSheetFonts(): Promise<SheetFontFiles> {
  fonts ??= Promise.all([
    read('400Regular/WorkSans_400Regular.ttf'),
    read('600SemiBold/WorkSans_600SemiBold.ttf'),
  ]).then(([regular, semibold]) => ({ regular, semibold }))
  return fonts
}
