/**
 * The seal over a finished file: a detached signature that any PDF reader checks.
 * With OpenSSL at hand the signature is PAdES baseline (it names its certificate inside what is signed);
 * without, it is the plain detached PKCS #7 kind, and is labelled as that.
 */
import { spawn, spawnSync } from 'node:child_process'
import { randomBytes } from 'node:crypto'
import { chmod, mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Writable } from 'node:stream'
import { plainAddPlaceholder } from '@signpdf/placeholder-plain'
import { SignPdf } from '@signpdf/signpdf'
import { Signer, SUBFILTER_ADOBE_PKCS7_DETACHED, SUBFILTER_ETSI_CADES_DETACHED } from '@signpdf/utils'
import forge from 'node-forge'

const YEARS_VALID = 10
const SIGNATURE_BYTES = 16_384

/** A new 2048-bit key with a certificate of its own for the organization, as an AES-256 encrypted PKCS #12 file. */
export function createSelfSignedP12({ organization, now = new Date(), passphrase = randomBytes(24).toString('base64url') }: { organization: string; now?: Date; passphrase?: string }): { p12: Buffer; passphrase: string } {
  const keys = forge.pki.rsa.generateKeyPair({ bits: 2048 })
  const certificate = forge.pki.createCertificate()
  certificate.publicKey = keys.publicKey
  // A leading zero keeps the number positive, as X.509 asks.
  certificate.serialNumber = `00${randomBytes(15).toString('hex')}`
  certificate.validity.notBefore = new Date(now.getTime() - 5 * 60_000)
  certificate.validity.notAfter = new Date(now)
  certificate.validity.notAfter.setFullYear(now.getFullYear() + YEARS_VALID)
  const utf8 = forge.asn1.Type.UTF8
  const field = (name: string, value: string) => ({ name, value, valueTagClass: utf8 as unknown as forge.asn1.Class })
  const subject = [field('commonName', `${organization} document seal`.slice(0, 64)), field('organizationName', organization.slice(0, 64))]
  certificate.setSubject(subject)
  certificate.setIssuer(subject)
  certificate.setExtensions([
    { name: 'basicConstraints', cA: false, critical: true },
    { name: 'keyUsage', digitalSignature: true, nonRepudiation: true, critical: true },
    { name: 'subjectKeyIdentifier' },
  ])
  certificate.sign(keys.privateKey, forge.md.sha256.create())
  const store = forge.pkcs12.toPkcs12Asn1(keys.privateKey, [certificate], passphrase, { algorithm: 'aes256', friendlyName: 'document seal' })
  return { p12: Buffer.from(forge.asn1.toDer(store).getBytes(), 'binary'), passphrase }
}

interface KeyAndCertificate { key: forge.pki.rsa.PrivateKey; own: forge.pki.Certificate; others: readonly forge.pki.Certificate[] }

/** @throws Error when the passphrase is wrong or the store lacks a key with its certificate */
function open(p12: Buffer, passphrase: string): KeyAndCertificate {
  const store = forge.pkcs12.pkcs12FromAsn1(forge.asn1.fromDer(forge.util.createBuffer(p12.toString('binary'))), false, passphrase)
  const bags = (type: string) => store.getBags({ bagType: type })[type] ?? []
  const key = [...bags(forge.pki.oids.pkcs8ShroudedKeyBag ?? ''), ...bags(forge.pki.oids.keyBag ?? '')].find((bag) => bag.key)?.key
  const certificates = bags(forge.pki.oids.certBag ?? '').flatMap((bag) => (bag.cert ? [bag.cert] : []))
  const own = certificates.find((certificate) => key && (certificate.publicKey as forge.pki.rsa.PublicKey).n.equals(key.n))
  if (!key || !own) throw new Error('The signing store holds no private key with a certificate that belongs to it.')
  return { key, own, others: certificates.filter((certificate) => certificate !== own) }
}

let openssl: boolean | undefined
/** Whether an OpenSSL that knows `cms -cades` can be run; looked up once. */
export function opensslSigns(): boolean {
  openssl ??= spawnSync('openssl', ['version'], { encoding: 'utf8' }).stdout?.startsWith('OpenSSL') ?? false
  return openssl
}

/**
 * Signs through OpenSSL. The content goes in by standard input; the key touches the disk only encrypted,
 * under a passphrase made for this one call and handed over by a pipe, and is removed at once.
 */
class CadesSigner extends Signer {
  constructor(private readonly store: KeyAndCertificate) {
    super()
  }

  override async sign(pdf: Buffer): Promise<Buffer> {
    const folder = await mkdtemp(join(tmpdir(), 'seal-'))
    try {
      await chmod(folder, 0o700)
      const passphrase = randomBytes(24).toString('base64url')
      const put = async (name: string, text: string): Promise<string> => {
        const file = join(folder, name)
        await writeFile(file, text, { mode: 0o600 })
        return file
      }
      const key = await put('key.pem', forge.pki.encryptRsaPrivateKey(this.store.key, passphrase, { algorithm: 'aes256' }))
      const certificate = await put('certificate.pem', forge.pki.certificateToPem(this.store.own))
      const chain = this.store.others.map((other) => forge.pki.certificateToPem(other)).join('')
      const more = chain ? ['-certfile', await put('chain.pem', chain)] : []
      return await run(['cms', '-sign', '-binary', '-cades', '-nosmimecap', '-md', 'sha256', '-signer', certificate, '-inkey', key, '-passin', 'fd:3', ...more, '-outform', 'DER'], pdf, passphrase)
    } finally {
      await rm(folder, { recursive: true, force: true })
    }
  }
}

/** Plain detached PKCS #7, in this process alone. */
class Pkcs7Signer extends Signer {
  constructor(private readonly store: KeyAndCertificate) {
    super()
  }

  override sign(pdf: Buffer, signingTime: Date = new Date()): Promise<Buffer> {
    const { key, own, others } = this.store
    // forge reads UTF-8 names as bytes and would encode them a second time when it names the issuer.
    for (const attribute of own.issuer.attributes) if ((attribute.valueTagClass as unknown) === forge.asn1.Type.UTF8 && typeof attribute.value === 'string') attribute.value = forge.util.decodeUtf8(attribute.value)
    const message = forge.pkcs7.createSignedData()
    message.content = forge.util.createBuffer(pdf.toString('binary'))
    for (const certificate of [own, ...others]) message.addCertificate(certificate)
    const { contentType, data, signingTime: time, messageDigest, sha256 } = forge.pki.oids as Record<'contentType' | 'data' | 'signingTime' | 'messageDigest' | 'sha256', string>
    message.addSigner({ key, certificate: own, digestAlgorithm: sha256, authenticatedAttributes: [{ type: contentType, value: data }, { type: time, value: signingTime as unknown as string }, { type: messageDigest }] })
    message.sign({ detached: true })
    return Promise.resolve(Buffer.from(forge.asn1.toDer(message.toAsn1()).getBytes(), 'binary'))
  }
}

/** Runs OpenSSL with content on standard input and a passphrase on descriptor 3; gives what it writes. */
function run(args: readonly string[], content: Buffer, passphrase: string): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const child = spawn('openssl', args, { stdio: ['pipe', 'pipe', 'pipe', 'pipe'] })
    const { stdin, stdout, stderr } = child
    const secret = child.stdio[3] as Writable
    const out: Buffer[] = []
    let complaint = ''
    stdout.on('data', (chunk: Buffer) => out.push(chunk))
    stderr.on('data', (chunk: Buffer) => (complaint += chunk.toString()))
    child.on('error', reject)
    child.on('close', (code) => (code === 0 && out.length > 0 ? resolve(Buffer.concat(out)) : reject(new Error(`OpenSSL could not sign the document (exit ${code}): ${complaint.trim().slice(0, 400)}`))))
    // A child that gives up early closes its ends; its exit code then says why.
    for (const end of [stdin, secret]) end.on('error', () => undefined)
    secret.end(`${passphrase}\n`)
    stdin.end(content)
  })
}

export interface SealOptions {
  p12: Buffer
  passphrase: string
  reason: string
  name: string
  location: string
  /** Leave out to use OpenSSL where it is installed. */
  format?: 'pades' | 'pkcs7'
}

/**
 * Seals a finished PDF; the signature covers every byte but its own.
 * @throws Error when the store can't be opened or OpenSSL refuses
 */
export async function signPdf(buffer: Buffer, { p12, passphrase, reason, name, location, format }: SealOptions): Promise<Buffer> {
  const store = open(p12, passphrase)
  const pades = (format ?? (opensslSigns() ? 'pades' : 'pkcs7')) === 'pades'
  const prepared = plainAddPlaceholder({ pdfBuffer: buffer, reason, name, location, contactInfo: '', signatureLength: SIGNATURE_BYTES, subFilter: pades ? SUBFILTER_ETSI_CADES_DETACHED : SUBFILTER_ADOBE_PKCS7_DETACHED })
  return new SignPdf().sign(prepared, pades ? new CadesSigner(store) : new Pkcs7Signer(store))
}
