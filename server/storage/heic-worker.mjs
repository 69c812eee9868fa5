// Unpacking a HEIC picture keeps a processor busy for a second or more; here it is not the one that answers requests.
// Plain JavaScript, so that it starts the same way under every loader.
import { parentPort } from 'node:worker_threads'
import heicConvert from 'heic-convert'

parentPort?.once('message', (/** @type {ArrayBuffer} */ bytes) => {
  // The decoder reads bytes one by one, whatever its types call them.
  const buffer = /** @type {ArrayBuffer} */ (/** @type {unknown} */ (new Uint8Array(bytes)))
  void heicConvert({ buffer, format: 'JPEG', quality: 0.9 }).then((jpeg) => {
    parentPort?.postMessage(new Uint8Array(jpeg))
    parentPort?.close()
  })
})
