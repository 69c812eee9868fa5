import { Worker } from 'node:worker_threads'

const LONGEST = 60_000

/**
 * A HEIC picture as JPEG, unpacked on a thread of its own.
 * @throws Error when the bytes cannot be read as HEIC, or it takes more than a minute
 */
export function heicToJpeg(bytes: Buffer): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const worker = new Worker(new URL('./heic-worker.mjs', import.meta.url), { execArgv: [], resourceLimits: { maxOldGenerationSizeMb: 1024 } })
    worker.postMessage(new Uint8Array(bytes).buffer)
    const timer = setTimeout(() => {
      void worker.terminate()
      reject(new Error('unpacking the picture took too long'))
    }, LONGEST)
    const settle = (done: () => void) => {
      clearTimeout(timer)
      done()
    }
    worker.once('message', (jpeg: Uint8Array) => settle(() => resolve(Buffer.from(jpeg))))
    worker.once('error', (error: unknown) => settle(() => reject(error instanceof Error ? error : new Error(String(error)))))
    worker.once('exit', (code) => settle(() => reject(new Error(`unpacking the picture ended with ${code}`))))
  })
}
