// The first lines of every thread: packages that need no loader, the loader of TypeScript, then the thread's own module.
const [, , module, ...ahead] = process.argv
await Promise.all(ahead.map((name) => import(name)))
const { register } = await import('tsx/esm/api')
register()
await import(module)
