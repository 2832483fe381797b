declare module 's3rver' {
  interface Options {
    port: number
    address: string
    silent: boolean
    directory: string
    configureBuckets: { name: string }[]
  }
  class S3rver {
    constructor(options: Options)
    run(): Promise<{ port: number }>
    close(): Promise<void>
  }
  export = S3rver
}
