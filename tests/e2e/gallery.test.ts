import { execFile } from 'node:child_process'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { promisify } from 'node:util'
import { preview, type PreviewServer } from 'vite'
import { afterAll, beforeAll, expect, inject, it } from 'vitest'
import { freePort } from '../../scripts/lib/ports.mjs'
import { axe, overflows, widths } from './browser.ts'
import { complaintsOf, useStage } from './stage.ts'

const stage = useStage()
let folder = ''
let server: PreviewServer | undefined
let address = ''

/** The product leaves the gallery out, so it is built once more with it and served beside the product, whose API it uses. */
beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'sidebend-gallery-'))
  await promisify(execFile)(process.execPath, ['node_modules/vite/bin/vite.js', 'build', '--outDir', folder, '--emptyOutDir'], { env: { ...process.env, NODE_ENV: 'production', VITE_GALLERY: '1' } })
  const port = await freePort()
  server = await preview({ configFile: false, logLevel: 'silent', build: { outDir: folder }, preview: { host: '127.0.0.1', port, strictPort: true, proxy: { '/api': inject('baseUrl') } } })
  address = `http://127.0.0.1:${port}`
})
afterAll(async () => {
  await server?.close()
  await rm(folder, { recursive: true, force: true })
})

it('shows every component in every state, by day and by night, and axe finds nothing', async () => {
  const page = await stage.stranger()
  const complaints = complaintsOf(page)
  await page.goto(`${address}/gallery`)
  await page.getByRole('heading', { level: 1, name: 'Gallery' }).waitFor()
  await page.waitForLoadState('networkidle')
  expect(await page.getByRole('heading', { level: 2 }).count(), 'it holds something').toBeGreaterThan(4)
  for (const night of [false, true]) {
    await page.evaluate((on) => document.documentElement.classList.toggle('night', on), night)
    for (const width of widths) {
      await page.setViewportSize({ width, height: 900 })
      expect([night, width, await overflows(page)]).toEqual([night, width, false])
    }
    await page.setViewportSize({ width: widths[0], height: 900 })
    expect([night, await axe(page)]).toEqual([night, []])
  }
  expect(complaints).toEqual([])
})

it('is no part of the product', async () => {
  const page = await stage.as('administrator')
  await page.goto('/gallery')
  await page.getByRole('heading', { level: 1, name: 'No sheet under this number' }).waitFor()
})
