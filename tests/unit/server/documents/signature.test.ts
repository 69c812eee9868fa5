import { readdirSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { beforeAll, describe, expect, it, vi } from 'vitest'
import { renderProcedure } from '../../../../server/documents/procedure.ts'
import { createSelfSignedP12, opensslSigns, signPdf, type SealOptions } from '../../../../server/documents/signature.ts'
import { procedureDocument } from '../../../fixtures/samples.ts'
import { infoOf, verifierOf, wordsOf } from './read.ts'

vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 })
let pdf: Buffer
let seal: SealOptions
beforeAll(async () => {
  pdf = await renderProcedure(procedureDocument())
  seal = { ...createSelfSignedP12({ organization: 'Larkfield Fabrication Łódź' }), reason: 'Approved – released (rev B)', name: 'Larkfield Fabrication', location: 'Larkfield' }
})

const formats = (['pkcs7', 'pades'] as const).filter((format) => format === 'pkcs7' || opensslSigns())

describe.each(formats)('a sealed document, %s', (format) => {
  it('is accepted by an outside verifier, over the whole file, in the organization\'s name', async () => {
    const said = verifierOf(await signPdf(pdf, { ...seal, format }))
    expect(said).toContain('Signature is Valid.')
    expect(said).toContain('Total document signed')
    expect(said).toContain('Larkfield Fabrication Łódź document seal')
    expect(said).toContain(format === 'pades' ? 'ETSI.CAdES.detached' : 'adbe.pkcs7.detached')
    expect(said).toContain('SHA-256')
  })

  it('is refused when one byte is altered', async () => {
    const signed = await signPdf(pdf, { ...seal, format })
    const altered = Buffer.from(signed)
    const at = altered.indexOf('/CreationDate') + 20
    altered[at] = (altered[at] ?? 0) ^ 1
    const said = verifierOf(altered)
    expect(said).not.toContain('Signature is Valid.')
    expect(said).toContain('Digest Mismatch')
  })

  it('changes nothing of what is read, and leaves no key behind', async () => {
    const before = readdirSync(tmpdir()).filter((name) => name.startsWith('seal-'))
    const signed = await signPdf(pdf, { ...seal, format })
    expect(wordsOf(signed)).toBe(wordsOf(pdf))
    expect(infoOf(signed)).toMatch(/Tagged: +yes/)
    expect(readdirSync(tmpdir()).filter((name) => name.startsWith('seal-') && !before.includes(name))).toEqual([])
    expect(signed.includes('PRIVATE KEY')).toBe(false)
  })
})

describe('the signing store', () => {
  it('is closed to a wrong passphrase, and each has its own', async () => {
    expect(createSelfSignedP12({ organization: 'Larkfield Fabrication' }).passphrase).not.toBe(seal.passphrase)
    await expect(signPdf(pdf, { ...seal, passphrase: 'wrong' })).rejects.toThrow()
  })

  it('says so when what it signs is not a PDF', async () => {
    await expect(signPdf(Buffer.from('plain text'), seal)).rejects.toThrow()
  })
})
