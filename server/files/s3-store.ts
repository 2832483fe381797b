import {
  DeleteObjectCommand,
  GetObjectCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  PutObjectCommand,
  S3Client,
  S3ServiceException,
} from '@aws-sdk/client-s3'
import { createHash } from 'node:crypto'
import { createReadStream } from 'node:fs'
import { rm, stat } from 'node:fs/promises'
import { Readable } from 'node:stream'
import { type FileStore, emptyIncoming, isSha256 } from './store.ts'

export interface S3Place {
  bucket: string
  endpoint: string
  region: string
  accessKeyId: string
  secretAccessKey: string
}

const connectMilliseconds = 5000
const answerMilliseconds = 60_000

/**
 * The store in an S3-compatible bucket, `files/ab/abcd…`. Uploads that are not yet accepted stay in `DATA_DIR/incoming`.
 * @throws Error in words when the bucket does not answer.
 */
export async function openS3Store(dataDir: string, { bucket, endpoint, region, ...credentials }: S3Place): Promise<FileStore> {
  const client = new S3Client({
    endpoint,
    region,
    credentials,
    forcePathStyle: true,
    // Checksums in trailers are not understood by every server: some keep the chunk headers as part of the file.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    requestHandler: { connectionTimeout: connectMilliseconds, requestTimeout: answerMilliseconds },
  })
  await client.send(new HeadBucketCommand({ Bucket: bucket })).catch((error: unknown) => {
    throw new Error(`The bucket ${bucket} at ${endpoint} cannot be used: ${error instanceof Error ? error.name : String(error)}.`)
  })
  const incoming = await emptyIncoming(dataDir)
  const at = (sha256: string) => ({ Bucket: bucket, Key: keyOf(sha256) })
  const sizeOf = async (sha256: string): Promise<number | undefined> => {
    try {
      return (await client.send(new HeadObjectCommand(at(sha256)))).ContentLength
    } catch (error) {
      if (error instanceof S3ServiceException && error.$metadata.httpStatusCode === 404) return undefined
      throw error
    }
  }
  const has = async (sha256: string) => (await sizeOf(sha256)) !== undefined
  const get = async (sha256: string, range?: { start: number; end: number }) => {
    const { Body } = await client.send(
      new GetObjectCommand({ ...at(sha256), ...(range ? { Range: `bytes=${range.start}-${range.end}` } : {}) }),
    )
    if (!Body) throw new Error(`The bucket sent nothing for ${sha256}.`)
    return Body
  }
  return {
    incoming,
    has,
    async adopt(path, sha256) {
      const isNew = !(await has(sha256))
      if (isNew) {
        const { size } = await stat(path)
        await client.send(new PutObjectCommand({ ...at(sha256), Body: createReadStream(path), ContentLength: size }))
        if ((await sizeOf(sha256)) !== size) throw new Error(`The bucket did not keep ${sha256} whole.`)
      }
      await rm(path, { force: true })
      return isNew
    },
    async discard(sha256) {
      await client.send(new DeleteObjectCommand(at(sha256)))
    },
    async keep(bytes) {
      const sha256 = createHash('sha256').update(bytes).digest('hex')
      if (!(await has(sha256))) await client.send(new PutObjectCommand({ ...at(sha256), Body: bytes, ContentLength: bytes.length }))
      return sha256
    },
    async size(sha256) {
      const size = await sizeOf(sha256)
      if (size === undefined) throw new Error(`The bucket does not hold ${sha256}.`)
      return size
    },
    read(sha256, range) {
      const chunks = async function* () {
        yield* (await get(sha256, range)) as unknown as AsyncIterable<Uint8Array>
      }
      return Readable.from(chunks(), { objectMode: false })
    },
    bytes: async (sha256) => new Uint8Array(await (await get(sha256)).transformToByteArray()),
  }
}

function keyOf(sha256: string): string {
  if (!isSha256(sha256)) throw new RangeError('not a SHA-256')
  return `files/${sha256.slice(0, 2)}/${sha256}`
}
