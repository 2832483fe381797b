import { resolve } from 'node:path'
import * as z from 'zod'

const s3 = ['S3_BUCKET', 'S3_ENDPOINT', 'S3_REGION', 'S3_ACCESS_KEY_ID', 'S3_SECRET_ACCESS_KEY'] as const

const text = z.string().trim().min(1, 'must not be blank')
const address = (protocol: RegExp, error: string) =>
  text.refine((value) => URL.canParse(value) && protocol.test(new URL(value).protocol), error)
const httpAddress = address(/^https?:$/, 'must be an http or https address')
/** Pages and API are served at the root. */
const publicAddress = httpAddress.refine(
  (value) => !URL.canParse(value) || new URL(value).href === `${new URL(value).origin}/`,
  'must be an address without a path',
)
const port = z
  .string()
  .trim()
  .regex(/^\d{1,5}$/, 'must be a whole number from 1 to 65535')
  .transform(Number)
  .refine((value) => value >= 1 && value <= 65535, 'must be a whole number from 1 to 65535')

const envSchema = z.object({
  PORT: port.default(4620),
  HOST: text.default('127.0.0.1'),
  DATA_DIR: text.default('./data'),
  DATABASE_URL: address(/^postgres(ql)?:$/, 'must be an address that begins with postgres://').optional(),
  DEMO: z.enum(['auto', 'off'], 'must be auto or off').default('auto'),
  SESSION_SECRET: z.string().min(32, 'must have at least 32 characters').optional(),
  PUBLIC_URL: publicAddress.optional(),
  SMTP_URL: address(/^smtps?:$/, 'must be an address that begins with smtp:// or smtps://').optional(),
  MAIL_FROM: z
    .string()
    .trim()
    .regex(/^[^\r\n]*\S@\S+$/, 'must be an e-mail address, or a name and an address in < >')
    .optional(),
  S3_BUCKET: text.optional(),
  S3_ENDPOINT: httpAddress.optional(),
  S3_REGION: text.optional(),
  S3_ACCESS_KEY_ID: text.optional(),
  S3_SECRET_ACCESS_KEY: text.optional(),
})

/** What is missing beside what is given. Asked of the raw values, so that it is told along with those that are wrong. */
function missing(given: Record<string, unknown>): string[] {
  const s3Given = s3.filter((name) => given[name])
  const s3Missing = s3Given.length > 0 ? s3.filter((name) => !given[name]) : []
  return [
    ...s3Missing.map((name) => `${name}: is missing while other S3 values are given`),
    ...(given['SMTP_URL'] && !given['MAIL_FROM'] ? ['MAIL_FROM: is needed with SMTP_URL'] : []),
  ]
}

export interface Environment {
  port: number
  host: string
  dataDir: string
  databaseUrl: string | undefined
  demo: 'auto' | 'off'
  sessionSecret: string | undefined
  publicUrl: string
  smtp: { url: string; from: string } | undefined
  s3: { bucket: string; endpoint: string; region: string; accessKeyId: string; secretAccessKey: string } | undefined
}

/**
 * Reads the environment once, at the start.
 * @throws Error listing every value that is wrong.
 */
export function readEnvironment(variables: NodeJS.ProcessEnv): Environment {
  const known = Object.keys(envSchema.shape)
  const given = Object.fromEntries(known.flatMap((name) => (variables[name] ? [[name, variables[name]]] : [])))
  const result = envSchema.safeParse(given)
  const issues = result.success ? [] : result.error.issues
  const wrong = issues
    .filter(({ path }, index) => issues.findIndex((other) => other.path[0] === path[0]) === index)
    .map(({ path, message }) => `${path.join('.')}: ${message}`)
  const all = [...wrong, ...missing(given)]
  if (!result.success || all.length > 0)
    throw new Error(`The environment is not right:\n${[...new Set(all)].map((line) => `  ${line}`).join('\n')}`)
  const env = result.data
  return {
    port: env.PORT,
    host: env.HOST,
    dataDir: resolve(env.DATA_DIR),
    databaseUrl: env.DATABASE_URL,
    demo: env.DEMO,
    sessionSecret: env.SESSION_SECRET,
    publicUrl: new URL(env.PUBLIC_URL ?? `http://localhost:${env.PORT}`).origin,
    smtp: env.SMTP_URL ? { url: env.SMTP_URL, from: env.MAIL_FROM ?? '' } : undefined,
    s3: env.S3_BUCKET
      ? {
          bucket: env.S3_BUCKET,
          endpoint: env.S3_ENDPOINT ?? '',
          region: env.S3_REGION ?? '',
          accessKeyId: env.S3_ACCESS_KEY_ID ?? '',
          secretAccessKey: env.S3_SECRET_ACCESS_KEY ?? '',
        }
      : undefined,
  }
}
