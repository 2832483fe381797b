import { resolve } from 'node:path'
import * as z from 'zod'

const optional = z.string().trim().min(1).optional()
const s3 = ['S3_BUCKET', 'S3_ENDPOINT', 'S3_REGION', 'S3_ACCESS_KEY_ID', 'S3_SECRET_ACCESS_KEY'] as const

const envSchema = z
  .object({
    PORT: z.coerce.number().int().min(1).max(65535).default(4620),
    HOST: z.string().trim().min(1).default('127.0.0.1'),
    DATA_DIR: z.string().trim().min(1).default('./data'),
    DATABASE_URL: z
      .string()
      .regex(/^postgres(ql)?:\/\//, 'must begin with postgres://')
      .optional(),
    DEMO: z.enum(['auto', 'off']).default('auto'),
    SESSION_SECRET: z.string().min(32, 'must have at least 32 characters').optional(),
    PUBLIC_URL: z.url({ protocol: /^https?$/, error: 'must be an http or https address' }).optional(),
    SMTP_URL: z
      .string()
      .regex(/^smtps?:\/\//, 'must begin with smtp:// or smtps://')
      .optional(),
    MAIL_FROM: z.string().trim().min(3).optional(),
    S3_BUCKET: optional,
    S3_ENDPOINT: optional,
    S3_REGION: optional,
    S3_ACCESS_KEY_ID: optional,
    S3_SECRET_ACCESS_KEY: optional,
  })
  .superRefine((env, context) => {
    const given = s3.filter((name) => env[name])
    if (given.length > 0 && given.length < s3.length) {
      for (const name of s3.filter((name) => !env[name]))
        context.addIssue({ code: 'custom', path: [name], message: 'is missing while other S3 values are given' })
    }
    if (env.SMTP_URL && !env.MAIL_FROM) context.addIssue({ code: 'custom', path: ['MAIL_FROM'], message: 'is needed with SMTP_URL' })
  })

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
  if (!result.success) {
    const lines = result.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`)
    throw new Error(`The environment is not right:\n${lines.join('\n')}`)
  }
  const env = result.data
  return {
    port: env.PORT,
    host: env.HOST,
    dataDir: resolve(env.DATA_DIR),
    databaseUrl: env.DATABASE_URL,
    demo: env.DEMO,
    sessionSecret: env.SESSION_SECRET,
    publicUrl: (env.PUBLIC_URL ?? `http://localhost:${env.PORT}`).replace(/\/+$/, ''),
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
