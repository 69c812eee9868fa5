// Unpacking a HEIC picture keeps a processor busy for a second or more; here it is not the one that answers requests.
// Plain JavaScript, so that it starts the same way under every loader.
import { parentPort, workerData } from 'node:worker_threads'
import heicConvert from 'heic-convert'

const { bytes } = /** @type {{ bytes: Uint8Array }} */ (workerData)
// The decoder wants the bytes themselves, though its types name the buffer beneath them.
const buffer = /** @type {ArrayBuffer} */ (/** @type {unknown} */ (bytes))
parentPort?.postMessage(new Uint8Array(await heicConvert({ buffer, format: 'JPEG', quality: 0.9 })))
