// A worker thread does not inherit the loader for TypeScript: register it here, then run the thread itself.
import { register } from 'tsx/esm/api'

register()
await import('./thread.ts')
