import { describe, expect, it } from 'vitest'
import { figure, fileSize } from '@/lib/figures.ts'
import { linkParts } from '@/features/outbox/links.ts'
import { returnPath, signInPath } from '@/shell/paths.ts'

describe('figure', () => {
  it.each([
    [20, '20'],
    [0.1 + 0.2, '0.3'],
    [-5, '−5'],
    [41200, '41\u2009200'],
    [1234.5678, '1234.57'],
    [0.38421, '0.3842'],
  ])('%s reads %s', (value, text) => expect(figure(value)).toBe(text))
  it('keeps the decimals asked for', () => expect(figure(5, 1)).toBe('5.0'))
})

describe('fileSize', () => {
  it.each([
    [812, '812 bytes'],
    [1400, '1.4 kB'],
    [184_220, '184 kB'],
    [2_500_000, '2.5 MB'],
  ])('%s is %s', (bytes, text) => expect(fileSize(bytes)).toBe(text))
})

describe('linkParts', () => {
  it('links web addresses without the full stop after them', () => {
    expect(linkParts('Open http://x.example/a?b=1. Thanks')).toEqual([{ text: 'Open ' }, { text: 'http://x.example/a?b=1', href: 'http://x.example/a?b=1' }, { text: '. Thanks' }])
  })
  it('links nothing else', () => expect(linkParts('javascript:alert(1) ftp://x')).toEqual([{ text: 'javascript:alert(1) ftp://x' }]))
})

describe('the way back after sign-in', () => {
  it('leads to the page asked for', () => {
    const path = signInPath({ pathname: '/revisions/1', search: '?a=b' })
    expect(returnPath(path.slice(path.indexOf('?')))).toBe('/revisions/1?a=b')
  })
  it.each(['https://evil.example', '//evil.example', '/\\evil.example', 'javascript:alert(1)'])('never leads out: %s', (target) => {
    expect(returnPath(`?to=${encodeURIComponent(target)}`)).toBe('/')
  })
})
