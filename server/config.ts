import path from 'node:path'
import { z } from 'zod'

/** `''` counts as not set, for that is what an empty line in an environment file gives. */
const text = z.string().trim().min(1).optional()
const flag = z.enum(['0', '1'])
const originSchema = z.url({ protocol: /^https?$/ }).transform((url) => new URL(url).origin)

const environmentSchema = z.object({
  /** Port of HTTP and of everything live. Default 8080. */
  PORT: z.coerce.number().int().min(0).max(65_535).default(8080),
  /** Address to listen on. Default: every interface, so that phones in the same network reach it. */
  HOST: z.string().default('0.0.0.0'),
  /** Where people reach the server, as in links of e-mails. Default `http://localhost:PORT`. With `https` cookies are secure. */
  PUBLIC_URL: originSchema.optional(),
  /** More origins from which the app is used, separated by commas. */
  ALLOWED_ORIGINS: text,
  /** PostgreSQL server to use in place of the cluster under `.data/`. */
  DATABASE_URL: text,
  /** Secret of cookies and wall links, 32 characters or more. Default: made once and kept in `.data/auth-secret`. */
  AUTH_SECRET: z.string().min(32).optional(),
  /** `1` serves the invented school, with one password for all and its mail open to see. Default `1`, with NODE_ENV=production `0`. */
  DEMO: flag.optional(),
  /** Key of the mail provider (Resend). Without it mail goes to the local fake, in the demo only. */
  RESEND_API_KEY: text,
  /** Sender of mail. */
  MAIL_FROM: z.string().default('Bicinium <bicinium@localhost.example>'),
  /** Address of the first administrator, who is sent a link to choose a password. Needed where there is no demo. */
  ADMIN_EMAIL: z.email().optional(),
  /** How many proxies stand before the server and may say where a request came from. Default 0: none is believed. */
  TRUST_PROXY: z.coerce.number().int().min(0).max(10).default(0),
  /** `trace` to `fatal`, or `silent`. Default `info`. */
  LOG_LEVEL: z.enum(['trace', 'debug', 'info', 'warn', 'error', 'fatal', 'silent']).default('info'),
  /** The exported web client. Default `dist/web`. */
  WEB_DIRECTORY: z.string().default('dist/web'),
  /** Where cluster, secret and stamps are kept. Default `.data`. */
  DATA_DIRECTORY: z.string().default('.data'),
  NODE_ENV: text,
})

export type Config = Readonly<{
  port: number
  host: string
  publicUrl: string
  /** Origins from which requests that change something and live connections are taken; `publicUrl` is among them. */
  allowedOrigins: readonly string[]
  databaseUrl: string | null
  /** Null: to be made and kept in the data directory. */
  authSecret: string | null
  isDemo: boolean
  mail: Readonly<{ apiKey: string | null; from: string }>
  adminEmail: string | null
  trustedProxies: number
  logLevel: string
  webDirectory: string
  dataDirectory: string
}>

export class ConfigError extends Error {
  override readonly name = 'ConfigError'
}

/** Reads the environment once, in the entry point. Throws `ConfigError` naming every variable that will not do. */
export function parseConfig(environment: Readonly<Record<string, string | undefined>>): Config {
  const set = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== ''))
  const parsed = environmentSchema.safeParse(set)
  if (!parsed.success) {
    throw new ConfigError(
      parsed.error.issues.map(({ path, message }) => `${path.join('.')}: ${message}`).join('\n'),
    )
  }
  const value = parsed.data
  const isDemo = (value.DEMO ?? (value.NODE_ENV === 'production' ? '0' : '1')) === '1'
  const missing = isDemo
    ? []
    : (['PUBLIC_URL', 'RESEND_API_KEY', 'ADMIN_EMAIL'] as const).filter((name) => !value[name])
  if (missing.length > 0) {
    throw new ConfigError(
      `Without the demo these must be set: ${missing.join(', ')}. (DEMO=1 serves the demo.)`,
    )
  }
  const publicUrl = value.PUBLIC_URL ?? `http://localhost:${value.PORT}`
  const more = (value.ALLOWED_ORIGINS ?? '')
    .split(',')
    .map((part) => part.trim())
    .filter(Boolean)
  const origins = z.array(originSchema).safeParse(more)
  if (!origins.success)
    throw new ConfigError('ALLOWED_ORIGINS: not a list of origins such as https://school.example')
  return {
    port: value.PORT,
    host: value.HOST,
    publicUrl,
    allowedOrigins: [...new Set([publicUrl, ...origins.data])],
    databaseUrl: value.DATABASE_URL ?? null,
    authSecret: value.AUTH_SECRET ?? null,
    isDemo,
    mail: { apiKey: value.RESEND_API_KEY ?? null, from: value.MAIL_FROM },
    adminEmail: value.ADMIN_EMAIL ?? null,
    trustedProxies: value.TRUST_PROXY,
    logLevel: value.LOG_LEVEL,
    webDirectory: path.resolve(value.WEB_DIRECTORY),
    dataDirectory: path.resolve(value.DATA_DIRECTORY),
  }
}
