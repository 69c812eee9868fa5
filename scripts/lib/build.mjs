import path from 'node:path'
import { runQuietly } from './children.mjs'
import { hashFiles, unlessStamped } from './hash.mjs'
import { withLock } from './lock.mjs'
import { dataDir, root } from './paths.mjs'

/** What the built client is made of. */
export const clientSources = ['src', 'shared', 'public', 'index.html', 'vite.config.ts', 'tsconfig.json', 'tailwind.config.ts', 'postcss.config.js', 'package.json', 'package-lock.json']

/**
 * Builds the client into dist/client unless that is already made of what stands here now.
 * @returns {Promise<boolean>} whether it was built
 * @throws {import('./steps.mjs').Refusal} with the end of the build's log
 */
export const ensureBuild = () =>
  withLock(path.join(dataDir(), 'build.lock'), () =>
    unlessStamped(path.join(root, 'dist/client.stamp'), hashFiles(root, clientSources), () =>
      runQuietly('Building the client', 'build', process.execPath, ['node_modules/vite/bin/vite.js', 'build'], { ...process.env, NODE_ENV: 'production' }),
    ),
  )
