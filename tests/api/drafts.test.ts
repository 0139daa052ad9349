import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { Draft, DraftEdit } from '@server/models/draft'
import { useApplication } from '../helpers/application'
import { signedIn } from '../helpers/client'
import type { HttpClient } from '../helpers/client'
import { SOUND_SECTION, aCommission } from '../helpers/factories/commissions'
import { pathsOf } from '../helpers/faults'

const listel = useApplication()
let designer: HttpClient
let other: HttpClient
beforeAll(async () => {
  designer = await signedIn(listel.app, { role: 'designer', name: 'First designer' })
  other = await signedIn(listel.app, { role: 'designer', name: 'Second designer' })
})

const putIn = (key: string, width: number) => ({
  act: 'do',
  name: `put in ${key}`,
  edit: { act: 'put-in', at: 0, member: { key, kind: 'fillet', width, rise: 0 } },
})
const setGesso = (value: number) => ({
  act: 'do',
  name: `gesso ${value}`,
  edit: { act: 'set', field: 'gesso', value },
})
const UNDO = { act: 'undo' }
const REDO = { act: 'redo' }

const save = (
  http: HttpClient,
  id: string,
  version: number,
  steps: readonly object[],
  operationId = randomUUID(),
) => http.post(`/commissions/${id}/draft/edits`, { version, operationId, steps })

describe('drawing', () => {
  it('takes steps, all under one new version, with who took them', async () => {
    const { id } = await aCommission()
    const answer = await save(designer, id, 1, [putIn('a', 4), setGesso(0.6)])
    expect(answer.status).toBe(200)
    expect(answer.body).toMatchObject({ version: 2, undo: 'gesso 0.6', redo: null })
    expect(answer.body.document.members).toEqual([{ key: 'a', kind: 'fillet', width: 4, rise: 0 }])
    expect(answer.body.history.map((line: { name: string; by: string }) => [line.name, line.by])).toEqual([
      ['put in a', 'First designer'],
      ['gesso 0.6', 'First designer'],
    ])
    const read = await designer.get(`/commissions/${id}/draft`)
    expect(read.body).toEqual(answer.body)
    expect((await designer.get(`/commissions/${id}/trail`)).body.at(-1)).toMatchObject({
      act: 'section-drawn',
      says: 'Drew: put in a; gesso 0.6',
    })
  })

  it('undoes all the way back and does again, step by step, to the same drawing', async () => {
    const { id } = await aCommission({ section: SOUND_SECTION })
    const steps = [
      { act: 'do', name: 'take out c', edit: { act: 'take-out', key: 'c' } },
      { act: 'do', name: 'move e', edit: { act: 'move', key: 'e', to: 0 } },
      setGesso(0.4),
    ]
    const drawn = await save(designer, id, 1, steps)
    const undone = await save(designer, id, 2, [UNDO, UNDO, UNDO])
    expect(undone.body.document).toEqual(SOUND_SECTION)
    expect(undone.body).toMatchObject({ undo: null, redo: 'take out c' })
    expect(undone.body.history.map((line: { undone: boolean }) => line.undone)).toEqual([true, true, true])
    const again = await save(designer, id, 3, [REDO, REDO, REDO])
    expect(again.body.document).toEqual(drawn.body.document)
    expect(again.body).toMatchObject({ undo: 'gesso 0.4', redo: null })
  })

  it('ends the chance to do again when something else is drawn, and keeps the rows', async () => {
    const { id } = await aCommission()
    await save(designer, id, 1, [setGesso(0.2), setGesso(0.4), UNDO])
    const answer = await save(designer, id, 2, [setGesso(0.8)])
    expect(answer.body).toMatchObject({ undo: 'gesso 0.8', redo: null })
    expect(answer.body.history.map((line: { name: string }) => line.name)).toEqual(['gesso 0.2', 'gesso 0.8'])
    const nothing = await save(designer, id, 3, [REDO])
    expect(nothing.status).toBe(409)
    expect(nothing.body.error.code).toBe('not-ready')
    const back = await save(designer, id, 3, [UNDO, UNDO])
    expect(back.body.document.gesso).toBe(0)
    const draft = await Draft.findOne({ where: { commissionId: id }, rejectOnEmpty: true })
    expect(await DraftEdit.count({ where: { draftId: draft.id } })).toBe(3)
  })

  it('says when there is nothing to undo, and then does nothing of what came with it', async () => {
    const { id } = await aCommission()
    const answer = await save(designer, id, 1, [setGesso(0.2), UNDO, UNDO])
    expect(answer.status).toBe(409)
    expect(answer.body.error.says).toBe('There is no step to undo.')
    expect((await designer.get(`/commissions/${id}/draft`)).body).toMatchObject({ version: 1, history: [] })
  })
})

describe('two designers on one draft', () => {
  it('refuses the second save with what stands now, and nothing of it is done', async () => {
    const { id } = await aCommission()
    await save(designer, id, 1, [putIn('a', 4)])
    const refused = await save(other, id, 1, [putIn('b', 5)])
    expect(refused.status).toBe(409)
    expect(refused.body.error.code).toBe('version-stale')
    expect(refused.body.error.draft).toEqual((await other.get(`/commissions/${id}/draft`)).body)
    expect(refused.body.error.draft.document.members.map((member: { key: string }) => member.key)).toEqual([
      'a',
    ])
    const onTop = await save(other, id, 2, [putIn('b', 5)])
    expect(onTop.body.document.members.map((member: { key: string }) => member.key)).toEqual(['b', 'a'])
  })

  it('lets exactly one through when they save at the same moment', async () => {
    const { id } = await aCommission()
    const sent = await Promise.all(
      Array.from({ length: 6 }, (_, n) =>
        save(n % 2 === 0 ? designer : other, id, 1, [putIn(`k${n}`, n + 1)]),
      ),
    )
    expect(sent.map(({ status }) => status).sort()).toEqual([200, 409, 409, 409, 409, 409])
    expect((await designer.get(`/commissions/${id}/draft`)).body.document.members).toHaveLength(1)
  })

  it('gives a repeated save the drawing as it stands, and does not draw twice', async () => {
    const { id } = await aCommission()
    const operationId = randomUUID()
    const first = await save(designer, id, 1, [putIn('a', 4)], operationId)
    const again = await save(designer, id, 1, [putIn('a', 4)], operationId)
    expect(again.status).toBe(200)
    expect(again.body).toEqual(first.body)
    const reused = await save(designer, id, 2, [putIn('b', 4)], operationId)
    expect(reused.body.error.code).toBe('operation-reused')
  })
})

describe('a step that cannot be taken', () => {
  const member = { key: 'a', kind: 'fillet', width: 4, rise: 0 }
  const step = (edit: unknown) => ({ act: 'do', name: 'x', edit })
  it.each<[string, object]>([
    ['/steps/0/edit', step({ act: 'take-out', key: 'nobody' })],
    ['/steps/0/edit', step({ act: 'put-in', at: 7, member })],
    ['/steps/0/edit/member/kind', step({ act: 'put-in', at: 0, member: { ...member, kind: 'swag' } })],
    ['/steps/0/edit/member/width', step({ act: 'put-in', at: 0, member: { ...member, width: 1e308 } })],
    ['/steps/0/edit/member/width', step({ act: 'put-in', at: 0, member: { ...member, width: null } })],
    ['/steps/0/edit/member/colour', step({ act: 'put-in', at: 0, member: { ...member, colour: 'gold' } })],
    ['/steps/0/edit/act', step({ act: 'explode' })],
    ['/steps/0/act', { act: 'redo-all' }],
    ['/steps/0/name', { act: 'do', edit: { act: 'take-out', key: 'a' } }],
  ])('is named: %s', async (path, wrong) => {
    const { id } = await aCommission()
    const answer = await save(designer, id, 1, [wrong])
    expect(answer.status).toBe(400)
    expect(pathsOf(answer)).toContain(path)
    expect((await designer.get(`/commissions/${id}/draft`)).body.version).toBe(1)
  })

  it('names the second of two, and the first is not taken', async () => {
    const { id } = await aCommission()
    const answer = await save(designer, id, 1, [putIn('a', 4), putIn('a', 4)])
    expect(pathsOf(answer)).toEqual(['/steps/1/edit'])
    expect((await designer.get(`/commissions/${id}/draft`)).body.document.members).toEqual([])
  })

  it.each([
    ['/steps', { version: 1, operationId: randomUUID(), steps: [] }],
    ['/version', { operationId: randomUUID(), steps: [setGesso(1)] }],
    ['/operationId', { version: 1, steps: [setGesso(1)] }],
  ])('or a save without %s', async (path, body) => {
    const { id } = await aCommission()
    expect(pathsOf(await designer.post(`/commissions/${id}/draft/edits`, body))).toEqual([path])
  })

  it('refuses thousands of nested steps instead of falling over', async () => {
    const { id } = await aCommission()
    const deep = '{"act":"together","edits":['.repeat(20_000) + ']}'.repeat(20_000)
    const body = `{"version":1,"operationId":"${randomUUID()}","steps":[{"act":"do","name":"x","edit":${deep}}]}`
    const answer = await designer.agent
      .post(`/api/commissions/${id}/draft/edits`)
      .set('Content-Type', 'application/json')
      .send(body)
    expect(answer.status).toBe(400)
    expect(answer.body.error.code).toBe('input-invalid')
  })
})
