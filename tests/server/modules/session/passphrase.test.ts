import { monitorEventLoopDelay } from 'node:perf_hooks'
import { describe, expect, it } from 'vitest'
import { passphraseSchema } from '../../../../shared/api/passphrase.ts'
import { hashPassphrase, passphraseFits } from '../../../../server/modules/session/passphrase.ts'

describe('a passphrase', () => {
  it('fits its own hash and no other', async () => {
    const hash = await hashPassphrase('studs are open today', 4)
    expect(hash).toMatch(/^\$2b\$04\$/)
    expect(await passphraseFits('studs are open today', hash, 4)).toBe(true)
    expect(await passphraseFits('studs are open todaY', hash, 4)).toBe(false)
    expect(await hashPassphrase('studs are open today', 4), 'salted').not.toBe(hash)
  })
  it('of nobody never fits', async () => {
    expect(await passphraseFits('', undefined, 4)).toBe(false)
  })
  it('over 72 bytes is refused rather than cut', async () => {
    const longest = 'é'.repeat(36)
    const hash = await hashPassphrase(longest, 4)
    await expect(hashPassphrase(`${longest}x`, 4)).rejects.toMatchObject({ code: 'invalid' })
    expect(await passphraseFits(`${longest}x`, hash, 4)).toBe(false)
  })
  it('is measured in bytes by its schema, as bcrypt does', () => {
    expect(passphraseSchema.safeParse('é'.repeat(36)).success).toBe(true)
    expect(passphraseSchema.safeParse('é'.repeat(37)).success).toBe(false)
    expect(passphraseSchema.safeParse('🔌'.repeat(18)).success).toBe(true)
    expect(passphraseSchema.safeParse('🔌'.repeat(19)).success).toBe(false)
    expect(passphraseSchema.safeParse('\ud800'.repeat(24)).success).toBe(true)
    expect(passphraseSchema.safeParse('\ud800'.repeat(25)).success).toBe(false)
  })
})

describe('hashing', () => {
  it('takes as long for nobody as for somebody', async () => {
    const hash = await hashPassphrase('studs are open today', 11)
    const time = async (given: string | undefined) => {
      const start = performance.now()
      await passphraseFits('a guess, nothing more', given, 11)
      return performance.now() - start
    }
    const somebody: number[] = []
    const nobody: number[] = []
    for (let i = 0; i < 5; i++) {
      somebody.push(await time(hash))
      nobody.push(await time(undefined))
    }
    expect(Math.min(...nobody) / Math.min(...somebody)).toBeGreaterThan(0.6)
    expect(Math.min(...nobody) / Math.min(...somebody)).toBeLessThan(1.7)
  })
  it('keeps nobody else waiting', async () => {
    const delay = monitorEventLoopDelay({ resolution: 5 })
    await hashPassphrase('warm the threads up', 4)
    delay.enable()
    const hashes = await Promise.all(Array.from({ length: 4 }, () => hashPassphrase('studs are open today', 11)))
    delay.disable()
    expect(new Set(hashes).size).toBe(4)
    // On this thread each of them would hold everything up for 100 ms and more; a busy machine may for a moment.
    expect(delay.percentile(90) / 1e6).toBeLessThan(50)
  })
  it('refuses those who would wait too long, and serves the rest', async () => {
    const answers = await Promise.allSettled(
      Array.from({ length: 90 }, () => hashPassphrase('studs are open today', 6)),
    )
    const refused = answers.filter((answer) => answer.status === 'rejected')
    expect(refused.length).toBe(90 - 62)
    expect(refused[0]!.reason).toMatchObject({ code: 'unavailable', details: { retryAfterSeconds: 3 } })
    expect(answers.filter((answer) => answer.status === 'fulfilled')).toHaveLength(62)
  })
})
