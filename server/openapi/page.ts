import type { oas31 } from 'zod-openapi'

type Schema = oas31.SchemaObject | oas31.ReferenceObject
type Document = oas31.OpenAPIObject
type Named = Readonly<Record<string, Schema>>

const escapes: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' }
const escaped = (text: string): string => text.replace(/[&<>"']/g, (c) => escapes[c] ?? c)

const nameOf = (ref: string): string => ref.split('/').at(-1) ?? ref
const link = (ref: string): string => `<a href="#${escaped(nameOf(ref))}">${escaped(nameOf(ref))}</a>`

/** A schema in one line of type notation, with links to named schemas. */
function typeOf(schema: Schema | undefined): string {
  if (!schema) return 'any'
  if ('$ref' in schema && schema.$ref) return link(schema.$ref)
  const s = schema as oas31.SchemaObject
  if (s.const !== undefined) return escaped(JSON.stringify(s.const))
  if (s.enum) return s.enum.map((value) => escaped(JSON.stringify(value))).join(' | ')
  const choices = s.anyOf ?? s.oneOf
  if (choices) return choices.map(typeOf).join(' | ')
  if (s.allOf) return s.allOf.map(typeOf).join(' &amp; ')
  if (s.type === 'array') return `list of ${typeOf(s.items)}`
  if (s.type === 'object' && s.properties) {
    const fields = Object.entries(s.properties).map(([name, inner]) => `${escaped(name)}${s.required?.includes(name) ? '' : '?'}: ${typeOf(inner)}`)
    return `{ ${fields.join('; ')} }`
  }
  const kind = Array.isArray(s.type) ? s.type.join(' | ') : (s.type ?? 'any')
  const limits = [s.format, s.minLength !== undefined && `from ${s.minLength} characters`, s.maxLength !== undefined && `to ${s.maxLength} characters`, s.minimum !== undefined && `≥ ${s.minimum}`, s.maximum !== undefined && `≤ ${s.maximum}`].filter(Boolean)
  return limits.length > 0 ? `${kind} (${escaped(limits.join(', '))})` : kind
}

/** Words with `code` in them. */
const prose = (text: string): string => escaped(text).replace(/`([^`]*)`/g, '<code>$1</code>')

/** The fields of an object schema as rows; anything else as one line. A named schema gives its name and its fields. */
function fieldsOf(schema: Schema | undefined, named: Named): string {
  if (schema && '$ref' in schema && schema.$ref) return `<p class="type">${link(schema.$ref)}</p>${fieldsOf(named[nameOf(schema.$ref)], {})}`
  const s = schema as oas31.SchemaObject | undefined
  if (!s || !('properties' in s) || !s.properties) return `<p class="type">${typeOf(schema)}</p>`
  const rows = Object.entries(s.properties).map(([name, inner]) => `<tr><th scope="row">${escaped(name)}</th><td>${s.required?.includes(name) ? '' : 'optional'}</td><td class="type">${typeOf(inner)}</td></tr>`)
  return `<table><thead><tr><th scope="col">field</th><th scope="col"></th><th scope="col">value</th></tr></thead><tbody>${rows.join('')}</tbody></table>`
}

const contentOf = (content: oas31.ContentObject | undefined, named: Named): string =>
  Object.entries(content ?? {}).map(([mediaType, { schema }]) => `<p><code>${escaped(mediaType)}</code></p>${fieldsOf(schema, named)}`).join('')

function operationHtml(method: string, path: string, operation: oas31.OperationObject, named: Named): string {
  const parameters = ((operation.parameters ?? []) as oas31.ParameterObject[]).map(
    (p) => `<tr><th scope="row">${escaped(p.name)}</th><td>${p.in}${p.required ? '' : ', optional'}</td><td class="type">${typeOf(p.schema)}</td></tr>`,
  )
  const body = operation.requestBody as oas31.RequestBodyObject | undefined
  const responses = Object.entries(operation.responses ?? {}).map(([status, response]: [string, oas31.ResponseObject]) => {
    const succeeds = status.startsWith('2')
    return `<dt>${status}</dt><dd>${prose(response.description)}${succeeds ? contentOf(response.content, named) : ''}</dd>`
  })
  const open = (operation.security ?? []).length === 0
  return `<details><summary><b>${method.toUpperCase()}</b> <code>${escaped(path)}</code> <span>${escaped(operation.summary ?? '')}</span></summary><div id="${escaped(operation.operationId ?? '')}">
    <p>${open ? 'No sign-in needed.' : 'Needs sign-in.'}</p>
    ${parameters.length > 0 ? `<h4>Parameters</h4><table><thead><tr><th scope="col">name</th><th scope="col">in</th><th scope="col">value</th></tr></thead><tbody>${parameters.join('')}</tbody></table>` : ''}
    ${body ? `<h4>Body</h4>${contentOf(body.content, named)}` : ''}
    <h4>Answers</h4><dl>${responses.join('')}</dl></div></details>`
}

const style = `
  :root { color-scheme: light; font: 15px/1.5 Inter, system-ui, sans-serif; background: #f5f3ee; color: #1b2226 }
  body { max-width: 70rem; margin: 0 auto; padding: 1.5rem }
  header { border: 1.5px solid #1b2226; background: #fff; padding: .8rem 1rem }
  h1 { margin: 0 } h2 { margin: 2rem 0 .4rem; border-bottom: 1.5px solid #1b2226 } h4 { margin: .8rem 0 .2rem }
  details { background: #fff; border: 1px solid #d9d5cb; border-top: 0; padding: .4rem .8rem } h2 + details { border-top: 1px solid #d9d5cb }
  summary { cursor: pointer } summary b { display: inline-block; min-width: 4.5rem } summary span { color: #5c676d }
  a { color: #2c4a5e } :focus-visible { outline: 2px solid #2c4a5e; outline-offset: 2px }
  table { border-collapse: collapse; width: 100% } th, td { text-align: left; vertical-align: top; padding: .15rem .8rem .15rem 0; border-bottom: 1px solid #e8e5dd; font-weight: 400 }
  thead th { color: #5c676d } tbody th, code, .type { font-family: ui-monospace, monospace; font-size: .88em; overflow-wrap: anywhere }
  dt { font-weight: 600 } dd { margin: 0 0 .3rem 2rem } p { margin: .2rem 0 }`

/** The API for reading: the document as one page without scripts. Ids stand inside the folds, so that following a link opens its fold. */
export function apiPage(document: Document): string {
  const named = document.components?.schemas ?? {}
  const operations = Object.entries(document.paths ?? {}).flatMap(([path, item]) =>
    Object.entries(item as Record<string, oas31.OperationObject>).map(([method, operation]) => ({ tag: operation.tags?.[0] ?? '', html: operationHtml(method, path, operation, named) })),
  )
  const tags = (document.tags ?? []).map(({ name }) => `<section><h2>${escaped(name)}</h2>${operations.filter(({ tag }) => tag === name).map(({ html }) => html).join('')}</section>`)
  const schemas = Object.entries(named).map(([name, schema]) => `<details><summary><code>${escaped(name)}</code></summary><div id="${escaped(name)}">${fieldsOf(schema, {})}</div></details>`)
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>Sidebend: API</title><link rel="icon" type="image/svg+xml" href="/mark.svg"><style>${style}</style></head>
<body><header><h1>Sidebend API</h1><p>${prose(document.info.description ?? '')}</p><p>All addresses begin with <code>/api</code>. The same as data: <a href="/api/openapi.json">openapi.json</a> (OpenAPI ${document.openapi}).</p></header>
<main>${tags.join('')}<section><h2>Shapes</h2>${schemas.join('')}</section></main></body></html>`
}
