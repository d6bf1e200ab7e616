import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { bedding, collection, feature, line, useIntakeDesk } from '../../support/intake-desk'

const desk = useIntakeDesk()

describe('a file that is brought', () => {
  it('is read, described and kept, and nothing is on the sheet yet', async () => {
    const content = collection([bedding(), feature({ type: 'contact' }, line())])
    const intake = await desk.brought(content, 'north shore.geojson')
    expect(intake).toMatchObject({
      file: 'north shore.geojson',
      reader: 'geojson',
      state: 'read',
      bytes: Buffer.byteLength(content),
      sha256: createHash('sha256').update(content).digest('hex'),
      by: { name: 'Rosa Kelp' },
      records: 2,
      points: 1,
      lines: 1,
      others: 0,
      extent: [-29.8391, 47.6516, -29.8217, 47.6649],
      mapping: null,
      revision: null,
      sameFileTakenIn: null,
      proposal: {
        points: { typeColumn: 'type', azimuthColumn: 'strike', dipColumn: 'dip', stationColumn: 'station' },
        lines: { typeColumn: 'type', types: { contact: { kind: 'contact' } } },
      },
    })
    expect(await desk.intakes()).toEqual([intake])
    expect(await desk.latest()).toBe(1)
  })

  it('is given back byte for byte, to be kept and not to be shown', async () => {
    const content = `\ufeff${collection([bedding({ note: '<script>alert(1)</script>' })])}\n`
    const intake = await desk.brought(content, 'Île.geojson')
    expect(await desk.original(intake)).toEqual(Buffer.from(content))
    const { headers } = await desk.compiler.get(`/api/sheets/${desk.sheet}/intakes/${intake.id}/file`)
    expect(headers['content-type']).toMatch(/^application\/octet-stream/)
    expect(headers['content-disposition']).toMatch(
      /^attachment; filename=.*filename\*=UTF-8''%C3%8Ele\.geojson/,
    )
    expect(headers['x-content-type-options']).toBe('nosniff')
  })

  it('is called by the last part of its name, whatever path was sent', async () => {
    expect((await desk.brought(collection([bedding()]), '../../etc/field.geojson')).file).toBe(
      'field.geojson',
    )
  })
})

describe('a preview', () => {
  it('counts what a mapping would take in, says readings in words, and changes nothing', async () => {
    const intake = await desk.brought(
      collection([bedding(), bedding({ dip: 95 }), feature({ type: 'dike' }, line())]),
    )
    expect(await desk.preview(intake)).toMatchObject({
      accepted: 2,
      refused: 1,
      outside: 0,
      leftOut: 0,
      byKind: [
        { kind: 'attitude', items: 1 },
        { kind: 'other-line', items: 1 },
      ],
      refusals: [{ record: 2, field: 'dip', value: '95' }],
      echoes: [{ record: 1, text: '310/40', words: 'Strikes 310°, dips 40° toward 040° (north-east)' }],
    })
    expect(await desk.latest()).toBe(1)
  })
})

describe('a file put aside', () => {
  it('can no longer be taken in, and its original stays', async () => {
    const content = collection([bedding()])
    const intake = await desk.brought(content)
    expect((await desk.discard(intake)).status).toBe(204)
    expect((await desk.takeIn(intake)).body.detail).toBe(
      'field.geojson was put aside. Bring it again to read it anew.',
    )
    expect((await desk.discard(intake)).status).toBe(409)
    expect(await desk.original(intake)).toEqual(Buffer.from(content))
    expect(await desk.latest()).toBe(1)
  })
})
