import { randomUUID } from 'node:crypto'
import { copyFile } from 'node:fs/promises'
import { existsSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import type { Actor } from '@shared/access'
import type { Reading } from '@shared/contracts'
import { uploadFolder } from '../files/file-store'
import { addPhotograph } from '../services/add-photograph'
import { readOffPhotograph } from '../services/photographs'

export interface DemoPhotograph {
  /** Name in examples/photographs. */
  readonly file: string
  readonly title: string
  readonly source: string
  readonly citation: string
  /** Two points a known distance apart, and how the photograph lies under the drawing. */
  readonly reading: Reading
}

/** Sends a photograph of the examples in, as a person would, and reads its scale off it. */
export async function showPhotograph(
  actor: Actor,
  commissionId: string,
  { file, title, source, citation, reading }: DemoPhotograph,
): Promise<void> {
  const path = join(await uploadFolder(), randomUUID())
  await copyFile(join(photographFolder(), file), path)
  const about = { operationId: randomUUID(), title, source, citation }
  const { photograph } = await addPhotograph(actor, commissionId, about, { path, name: file })
  await readOffPhotograph(actor, photograph.id, { operationId: randomUUID(), document: reading })
}

/** examples/photographs, found upwards from here: this file may run from its source or out of a bundle. */
function photographFolder(): string {
  let folder = dirname(fileURLToPath(import.meta.url))
  for (;;) {
    const found = join(folder, 'examples', 'photographs')
    if (existsSync(found)) return found
    const above = dirname(folder)
    if (above === folder) throw new Error('The demo needs the folder examples/photographs of the project.')
    folder = above
  }
}
