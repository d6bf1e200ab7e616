import { describe, expect, it } from 'vitest'
import { isLoopback, readConfig } from '../../../server/config'

const base = { DATABASE_URL: 'postgresql://localhost/x' }

describe('settings', () => {
  it('have a value each where the environment says nothing', () => {
    expect(readConfig(base)).toMatchObject({
      port: 4310,
      host: '127.0.0.1',
      url: 'http://127.0.0.1:4310',
      demo: false,
      parts: { web: true, worker: true },
    })
  })

  it.each([
    [{ SHEETWRIGHT_DEMO: '1' }, true],
    [{ SHEETWRIGHT_DEMO: '0' }, false],
    [{ SHEETWRIGHT_DEMO: '1', SHEETWRIGHT_HOST: '0.0.0.0' }, false],
    [{ SHEETWRIGHT_DEMO: '1', SHEETWRIGHT_HOST: '192.168.1.4' }, false],
    [{ SHEETWRIGHT_DEMO: '1', SHEETWRIGHT_URL: 'https://maps.merrow.example' }, false],
    [{ SHEETWRIGHT_DEMO: '1', SHEETWRIGHT_HOST: 'localhost' }, true],
  ])('serve the demo on loopback only: %j', (settings, demo) => {
    expect(readConfig({ ...base, ...settings }).demo).toBe(demo)
  })

  it('say every one that is wrong, by its name', () => {
    const wrong = { PORT: 'abc', SHEETWRIGHT_SESSION_SECRET: 'short', SHEETWRIGHT_DEMO: 'yes' }
    const read = () => readConfig(wrong)
    for (const name of [...Object.keys(wrong), 'DATABASE_URL']) expect(read).toThrow(name)
  })

  it.each([
    ['127.0.0.1', true],
    ['127.9.9.9', true],
    ['localhost', true],
    ['::1', true],
    ['[::1]', true],
    ['127.0.0.1.evil.example', false],
    ['localhost.example', false],
    ['0.0.0.0', false],
    ['10.0.0.1', false],
  ])('know this machine from others: %s', (host, expected) => {
    expect(isLoopback(host)).toBe(expected)
  })
})
