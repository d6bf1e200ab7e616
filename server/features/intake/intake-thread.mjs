// Entry point of the intake thread. A worker thread does not inherit the TypeScript loader of the main one, so it
// registers its own; under a bundler this file would be the only one to change.
import { fileURLToPath } from 'node:url'
import { register } from 'tsx/esm/api'

register({ tsconfig: fileURLToPath(new URL('../../tsconfig.json', import.meta.url)) })
await import('./intake-thread.ts')
