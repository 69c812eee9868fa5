/**
 * Preloaded into the server by start, dev and the browser tests: when the process that started it is gone,
 * even by kill -9, the server stops as if asked to, and nothing is left running unseen.
 */
import { isMainThread } from 'node:worker_threads'

if (isMainThread && process.channel) {
  process.once('disconnect', () => process.kill(process.pid, 'SIGTERM'))
  process.channel.unref()
}
