/**
 * The client's side of the API: one typed function over the shared registry.
 * Paths, methods and shapes come from shared/schemas/endpoints.ts; nothing here knows a resource by name.
 */
import type { Endpoint } from '@shared/schemas/endpoint.ts'
import { endpoints, type BodyOf, type EndpointName, type ParamsOf, type QueryOf, type ResponseOf } from '@shared/schemas/endpoints.ts'
import { problemFrom, unreachable, type ProblemError } from './problem.ts'

const BASE = '/api'

export interface CallOptions<N extends EndpointName> {
  params?: ParamsOf<N>
  query?: QueryOf<N>
  body?: BodyOf<N>
  /** Version last read; sent as If-Match. */
  ifMatch?: number
  signal?: AbortSignal
}

export interface UploadOptions<N extends EndpointName> extends Omit<CallOptions<N>, 'body'> {
  files: readonly File[]
  /** Share sent, 0 to 1. */
  onProgress?: (share: number) => void
}

const signedOut = new Set<() => void>()
/** Tells a listener whenever the server answers 401. Returns the way to stop listening. */
export function onSignedOut(listener: () => void): () => void {
  signedOut.add(listener)
  return () => signedOut.delete(listener)
}

function refused(name: EndpointName, status: number, body: unknown): ProblemError {
  if (status === 401 && name !== 'signIn') for (const listener of signedOut) listener()
  return problemFrom(status, body)
}

const asText = (value: unknown): string => (typeof value === 'string' ? value : JSON.stringify(value))

/** The address of an endpoint, e.g. for a download link or an image. Empty and missing query values are left out. */
export function hrefOf<N extends EndpointName>(name: N, params?: ParamsOf<N>, query?: QueryOf<N>): string {
  const given: Record<string, unknown> = { ...(params as object | undefined) }
  const path = endpoints[name].path.replace(/:(\w+)/g, (_match, key: string) => {
    const value = given[key]
    if (value === undefined || value === null || value === '') throw new RangeError(`${name} needs the path value "${key}"`)
    return encodeURIComponent(asText(value))
  })
  const search = new URLSearchParams()
  for (const [key, value] of Object.entries((query ?? {}) as Record<string, unknown>))
    if (value !== undefined && value !== null && value !== '') search.set(key, asText(value))
  const text = search.toString()
  return `${BASE}${path}${text ? `?${text}` : ''}`
}

const parse = (text: string): unknown => {
  if (!text) return undefined
  try {
    return JSON.parse(text)
  } catch {
    return undefined
  }
}

/**
 * Calls an endpoint by its name in the registry.
 * @returns what the endpoint's response schema says; undefined for endpoints without one
 * @throws ProblemError on any refusal and when the server cannot be reached; AbortError when `signal` is aborted
 */
export async function call<N extends EndpointName>(name: N, options: CallOptions<N> = {}): Promise<ResponseOf<N>> {
  const endpoint: Endpoint = endpoints[name]
  const headers = new Headers({ Accept: 'application/json, application/problem+json' })
  if (options.body !== undefined) headers.set('Content-Type', 'application/json')
  if (options.ifMatch !== undefined) headers.set('If-Match', `"${options.ifMatch}"`)
  const init: RequestInit = { method: endpoint.method.toUpperCase(), headers, credentials: 'same-origin' }
  if (options.body !== undefined) init.body = JSON.stringify(options.body)
  if (options.signal) init.signal = options.signal

  let response: Response
  let text: string
  try {
    response = await fetch(hrefOf(name, options.params, options.query), init)
    text = await response.text()
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error
    throw unreachable()
  }
  const body = parse(text)
  if (!response.ok) throw refused(name, response.status, body)
  return body as ResponseOf<N>
}

/**
 * Uploads files to a multipart endpoint, with progress; fetch tells none, so this is an XMLHttpRequest.
 * @throws ProblemError as `call` does; AbortError when `signal` is aborted
 */
export function upload<N extends EndpointName>(name: N, options: UploadOptions<N>): Promise<ResponseOf<N>> {
  const endpoint: Endpoint = endpoints[name]
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest()
    request.open(endpoint.method.toUpperCase(), hrefOf(name, options.params, options.query))
    request.setRequestHeader('Accept', 'application/json, application/problem+json')
    if (options.ifMatch !== undefined) request.setRequestHeader('If-Match', `"${options.ifMatch}"`)
    request.upload.onprogress = (event) => event.lengthComputable && options.onProgress?.(event.loaded / event.total)
    request.onload = () => {
      const body = parse(request.responseText)
      if (request.status >= 200 && request.status < 300) resolve(body as ResponseOf<N>)
      else reject(refused(name, request.status, body))
    }
    request.onerror = () => reject(unreachable())
    request.onabort = () => reject(new DOMException('The upload was cancelled.', 'AbortError'))
    options.signal?.addEventListener('abort', () => request.abort(), { once: true })
    const form = new FormData()
    for (const file of options.files) form.append('files', file, file.name)
    request.send(form)
  })
}
