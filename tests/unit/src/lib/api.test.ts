// @vitest-environment jsdom
import { afterEach, describe, expect, it, vi } from 'vitest'
import { call, hrefOf, onSignedOut, upload } from '@/lib/api.ts'
import { ProblemError } from '@/lib/problem.ts'
import { mockApi, problem } from '../support/render.tsx'

const id = '5f0c1c86-5d4e-4f5f-8a51-0d7b3a4f1c01'

describe('hrefOf', () => {
  it('fills the path and leaves empty query values out', () => {
    expect(hrefOf('readRevision', { id })).toBe(`/api/revisions/${id}`)
    expect(hrefOf('listProcedures', {}, { q: 'pipe & plate', state: undefined, limit: 20 })).toBe('/api/procedures?q=pipe+%26+plate&limit=20')
  })
  it('escapes what it puts into the path', () => {
    expect(hrefOf('resetPassword', { token: 'a/b c' })).toBe('/api/password-resets/a%2Fb%20c')
  })
  it('refuses a missing path value', () => {
    expect(() => hrefOf('readRevision', { id: '' })).toThrow(RangeError)
  })
})

describe('call', () => {
  it('sends the body as JSON with the version last read', async () => {
    const seen = mockApi({ [`PATCH /api/people/${id}`]: { body: { id, version: 4 } } })
    await expect(call('changePerson', { params: { id }, body: { active: false }, ifMatch: 3 })).resolves.toEqual({ id, version: 4 })
    expect(seen[0]?.body).toEqual({ active: false })
    expect(seen[0]?.headers.get('if-match')).toBe('"3"')
    expect(seen[0]?.headers.get('content-type')).toBe('application/json')
  })
  it('gives undefined for an empty answer', async () => {
    mockApi({ 'DELETE /api/session': { status: 204 } })
    await expect(call('signOut')).resolves.toBeUndefined()
  })
  it('throws the problem with its fields and the current record', async () => {
    mockApi({ [`PATCH /api/people/${id}`]: problem(409, 'Somebody else saved first.', { current: { version: 9 }, errors: [{ field: 'name', message: 'Taken.' }], requestId: 'r-1' }) })
    const error = await call('changePerson', { params: { id }, body: {}, ifMatch: 3 }).catch((thrown: unknown) => thrown)
    if (!(error instanceof ProblemError)) throw new Error('not a problem')
    expect(error.isConflict).toBe(true)
    expect(error.current).toEqual({ version: 9 })
    expect(error.fields).toEqual([{ field: 'name', message: 'Taken.' }])
    expect(error.requestId).toBe('r-1')
  })
  it('words an answer that is no problem document', async () => {
    vi.stubGlobal('fetch', () => Promise.resolve(new Response('<html>bad gateway</html>', { status: 502 })))
    await expect(call('readToday')).rejects.toThrow(/Nothing you typed is lost/)
  })
  it('says when the server cannot be reached', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')))
    await expect(call('readToday')).rejects.toMatchObject({ status: 0 })
  })
  it('lets an abort through as an abort', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new DOMException('stop', 'AbortError')))
    await expect(call('readToday')).rejects.toMatchObject({ name: 'AbortError' })
  })
  it('tells that the session is over on 401, but not when sign-in is refused', async () => {
    const told = vi.fn()
    const stop = onSignedOut(told)
    mockApi({ 'GET /api/today': problem(401, 'Sign in first.'), 'POST /api/session': problem(401, 'E-mail and password do not fit together.') })
    await expect(call('signIn', { body: { email: 'a@larkfield.example', password: 'x' } })).rejects.toThrow('do not fit')
    expect(told).not.toHaveBeenCalled()
    await expect(call('readToday')).rejects.toThrow()
    expect(told).toHaveBeenCalledTimes(1)
    stop()
    await expect(call('readToday')).rejects.toThrow()
    expect(told).toHaveBeenCalledTimes(1)
  })
})

class FakeRequest {
  static last: FakeRequest
  upload: { onprogress?: (event: { lengthComputable: boolean; loaded: number; total: number }) => void } = {}
  onload?: () => void
  onerror?: () => void
  onabort?: () => void
  status = 0
  responseText = ''
  sent: FormData | null = null
  opened: [string, string] = ['', '']
  constructor() {
    FakeRequest.last = this
  }
  open(method: string, address: string) {
    this.opened = [method, address]
  }
  setRequestHeader() {}
  send(body: FormData) {
    this.sent = body
  }
  abort() {
    this.onabort?.()
  }
  answer(status: number, body: unknown) {
    this.status = status
    this.responseText = JSON.stringify(body)
    this.onload?.()
  }
}

describe('upload', () => {
  afterEach(() => vi.unstubAllGlobals())
  const files = [new File(['x'], 'root.jpg', { type: 'image/jpeg' })]

  it('sends the files and tells how far it is', async () => {
    vi.stubGlobal('XMLHttpRequest', FakeRequest)
    const shares: number[] = []
    const done = upload('addPhotos', { params: { id }, files, onProgress: (share) => shares.push(share) })
    const request = FakeRequest.last
    request.upload.onprogress?.({ lengthComputable: true, loaded: 1, total: 4 })
    request.answer(201, { items: [] })
    await expect(done).resolves.toEqual({ items: [] })
    expect(request.opened).toEqual(['POST', `/api/coupons/${id}/photos`])
    expect(request.sent?.getAll('files')).toHaveLength(1)
    expect(shares).toEqual([0.25])
  })
  it('throws the refusal, and stops when cancelled', async () => {
    vi.stubGlobal('XMLHttpRequest', FakeRequest)
    const refused = upload('addPhotos', { params: { id }, files })
    FakeRequest.last.answer(415, { type: 'about:blank', title: 'Wrong kind', status: 415, detail: 'root.jpg is no JPEG.' })
    await expect(refused).rejects.toThrow('root.jpg is no JPEG.')
    const stop = new AbortController()
    const cancelled = upload('addPhotos', { params: { id }, files, signal: stop.signal })
    stop.abort()
    await expect(cancelled).rejects.toMatchObject({ name: 'AbortError' })
  })
})
