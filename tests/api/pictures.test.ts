import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { Measurement, Picture } from '@server/models/commission'
import { useApplication } from '../helpers/application'
import { signedIn } from '../helpers/client'
import type { HttpClient } from '../helpers/client'
import { MEASUREMENT, aCommission, aPicture } from '../helpers/factories/commissions'
import { pathsOf } from '../helpers/faults'

const listel = useApplication()
let designer: HttpClient
beforeAll(async () => {
  designer = await signedIn(listel.app, { role: 'designer' })
})

describe('pictures', () => {
  it('are added in order, changed, measured again and again, and never lose a measurement', async () => {
    const { id } = await aCommission()
    const add = (name: string) =>
      designer.post(`/commissions/${id}/pictures`, { operationId: randomUUID(), name, copies: 1 })
    const left = await add('Left wing')
    const right = await add('Right wing')
    expect([left.body.position, right.body.position]).toEqual([1, 2])
    const changed = await designer.patch(`/pictures/${left.body.id}`, { version: 0, copies: 3 })
    expect(changed.body).toMatchObject({ copies: 3, version: 1, measurement: null })
    const measure = (width: number) =>
      designer.post(`/pictures/${left.body.id}/measurements`, {
        operationId: randomUUID(),
        document: { ...MEASUREMENT, width: [width] },
      })
    await measure(900)
    const second = await measure(901.25)
    expect(second.body.measurement).toMatchObject({ no: 2, document: { width: [901.25] } })
    const all = await designer.get(`/pictures/${left.body.id}/measurements`)
    expect(all.body.map((one: { no: number }) => one.no)).toEqual([2, 1])
    expect(await Measurement.count({ where: { pictureId: left.body.id } })).toBe(2)
    expect((await designer.get(`/commissions/${id}`)).body.pictures).toHaveLength(2)
  })

  it('are measured once for an operation', async () => {
    const picture = await aPicture(await aCommission())
    const body = { operationId: randomUUID(), document: MEASUREMENT }
    await Promise.all([1, 2, 3].map(() => designer.post(`/pictures/${picture.id}/measurements`, body)))
    expect(await Measurement.count({ where: { pictureId: picture.id } })).toBe(1)
  })

  it('get a number each when measured by several at once', async () => {
    const picture = await aPicture(await aCommission())
    const sent = await Promise.all(
      [1, 2, 3, 4].map(() =>
        designer.post(`/pictures/${picture.id}/measurements`, {
          operationId: randomUUID(),
          document: MEASUREMENT,
        }),
      ),
    )
    expect(sent.map(({ status }) => status)).toEqual([200, 200, 200, 200])
    const rows = await Measurement.findAll({ where: { pictureId: picture.id }, order: [['no', 'ASC']] })
    expect(rows.map(({ no }) => no)).toEqual([1, 2, 3, 4])
  })

  it.each([
    ['/document/width', { width: [] }],
    ['/document/width/0', { width: [-1] }],
    ['/document/height/0', { height: ['610'] }],
    ['/document/diagonals', { diagonals: [1, 2, 3] }],
    ['/document/thickness', { thickness: -0.1 }],
    ['/document/allowance', { allowance: 1e308 }],
    ['/document/stack/glazing', { stack: { ...MEASUREMENT.stack, glazing: 'thick' } }],
    ['/document/measuredOn', { measuredOn: 'today' }],
    ['/document/weight', { weight: 3 }],
  ])('name the field %s', async (path, change) => {
    const picture = await aPicture(await aCommission())
    const answer = await designer.post(`/pictures/${picture.id}/measurements`, {
      operationId: randomUUID(),
      document: { ...MEASUREMENT, ...change },
    })
    expect(answer.status).toBe(400)
    expect(pathsOf(answer)).toEqual([path])
  })

  it.each([
    ['/copies', { name: 'A', copies: 0 }],
    ['/copies', { name: 'A', copies: 1.5 }],
    ['/name', { name: '', copies: 1 }],
  ])('name the field %s of a new one', async (path, body) => {
    const { id } = await aCommission()
    const answer = await designer.post(`/commissions/${id}/pictures`, { operationId: randomUUID(), ...body })
    expect(pathsOf(answer)).toEqual([path])
    expect(await Picture.count({ where: { commissionId: id } })).toBe(0)
  })
})
