import { describe, expect, it } from 'vitest'
import { installedMatches } from '../../../scripts/lib/packages.mjs'
import { checkNode, missingPackages, planPackages } from '../../../scripts/lib/system.mjs'

describe('planPackages', () => {
  it('does nothing when nothing is missing', () => {
    expect(planPackages([], { isRoot: false, hasApt: false })).toEqual({ act: 'nothing' })
  })

  it('installs as root where there is apt-get', () => {
    expect(planPackages(['postgresql', 'openssl'], { isRoot: true, hasApt: true })).toEqual({ act: 'install', command: 'apt-get update && apt-get install -y --no-install-recommends postgresql openssl' })
  })

  it('gives an ordinary user the one command', () => {
    const plan = planPackages(['chromium'], { isRoot: false, hasApt: true })
    expect(plan).toMatchObject({ act: 'ask' })
    expect(plan.act === 'ask' && plan.sentence).toContain("sudo sh -c 'apt-get update && apt-get install -y --no-install-recommends chromium'")
  })

  it('names the packages where there is no apt-get', () => {
    const plan = planPackages(['postgresql'], { isRoot: true, hasApt: false })
    expect(plan.act === 'ask' && plan.sentence).toMatch(/postgresql.*package manager/)
  })
})

describe('missingPackages', () => {
  it('takes a package that it cannot look for as missing', () => {
    expect(missingPackages(['no-such-package'])).toEqual(['no-such-package'])
  })
})

describe('checkNode', () => {
  it.each(['20.19.0', '20.20.2', '22.0.0', '24.1.0'])('accepts %s', (version) => {
    expect(() => checkNode(version)).not.toThrow()
  })
  it.each(['18.20.0', '20.18.9', '20.9.0'])('refuses %s and says what is needed', (version) => {
    expect(() => checkNode(version)).toThrow(`This is Node ${version}; Sidebend needs 20.19 or later`)
  })
})

describe('installedMatches', () => {
  const one = { version: '1.0.0', integrity: 'sha512-a' }
  const lock = { packages: { '': {}, 'node_modules/a': one, 'node_modules/other-system': { version: '2.0.0', integrity: 'sha512-b', optional: true } } }

  it('accepts what the lock asks for, without the optional packages of other systems', () => {
    expect(installedMatches(lock, { packages: { 'node_modules/a': one } })).toBe(true)
  })

  it.each([
    ['another version', { 'node_modules/a': { ...one, version: '1.0.1' } }],
    ['other contents under the same version', { 'node_modules/a': { ...one, integrity: 'sha512-c' } }],
    ['a package missing', {}],
    ['a package that the lock no longer has', { 'node_modules/a': one, 'node_modules/old': one }],
    ['another version of an optional package', { 'node_modules/a': one, 'node_modules/other-system': { version: '1.9.0', integrity: 'sha512-d' } }],
  ])('refuses %s', (_what, packages) => {
    expect(installedMatches(lock, { packages })).toBe(false)
  })
})
