declare module 's3rver' {
  interface Options {
    port: number
    address: string
    silent: boolean
    directory: string
    configureBuckets: { name: string }[]
  }
  export default class S3rver {
    constructor(options: Options)
    run(): Promise<{ port: number }>
    close(): Promise<void>
  }
}
