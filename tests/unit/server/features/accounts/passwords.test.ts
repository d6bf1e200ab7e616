import { describe, expect, it } from 'vitest'
import { toInitials } from '../../../../../server/features/accounts/initials'
import { hashPassword, isPassword } from '../../../../../server/features/accounts/passwords'

describe('passwords', () => {
  it('are hashed with Argon2id at the cost that OWASP asks for, each with a salt of its own', async () => {
    const [first, second] = [await hashPassword('merrow'), await hashPassword('merrow')]
    // Source: OWASP Password Storage Cheat Sheet: Argon2id, m=19456 (19 MiB), t=2, p=1.
    expect(first).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/)
    expect(first).not.toBe(second)
  })

  it('are told from others', async () => {
    const hashed = await hashPassword('merrow')
    expect(await isPassword('merrow', hashed)).toBe(true)
    expect(await isPassword('Merrow', hashed)).toBe(false)
    expect(await isPassword('', hashed)).toBe(false)
  })

  it('are never right where there is none', async () => {
    expect(await isPassword('', null)).toBe(false)
    expect(await isPassword('anything', null)).toBe(false)
  })
})

describe('initials', () => {
  it.each([
    ['Rosa Kelp', 'RK'],
    ['ada maria holm', 'AH'],
    ['Björk', 'B'],
    ['  Örn   Ek ', 'ÖE'],
    ['𝕏avier Ng', '𝕏N'],
  ])('of %s', (name, initials) => {
    expect(toInitials(name)).toBe(initials)
  })
})
