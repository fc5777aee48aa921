import { register } from 'tsx/esm/api'

// A thread does not inherit the way its process runs TypeScript, so it says so itself.
register()
await import('./pdf-thread.ts')
