import { z } from 'zod';

const flag = z.enum(['0', '1']).default('0');

const environment = z.object({
  DATABASE_URL: z.string().min(1),
  DATABASE_MIGRATION_URL: z.string().optional(),
  PORT: z.coerce.number().int().min(0).max(65535).default(4600),
  HOST: z.string().default('127.0.0.1'),
  DRIPRAIL_DATA: z.string().default('.data'),
  DRIPRAIL_DEMO: flag,
  DRIPRAIL_WEB_DIST: z.string().optional(),
  /** Starts the clock at this instant instead of now; for tests and pictures. */
  DRIPRAIL_NOW: z.iso.datetime({ offset: true }).optional(),
  /** Cheap password hashes; for tests only. */
  DRIPRAIL_TEST: flag,
  SESSION_SECRET: z.string().min(16).optional(),
  SMTP_URL: z.string().optional(),
  MAIL_FROM: z.string().default('Driprail <no-reply@driprail.example>'),
  PUBLIC_URL: z.url().optional(),
  TRUST_PROXY: flag,
  /** The key pair of web push; without it, made once in the data folder. */
  VAPID_PUBLIC_KEY: z.string().optional(),
  VAPID_PRIVATE_KEY: z.string().optional(),
  /** Photos go to this bucket; without it, to the data folder. */
  S3_BUCKET: z.string().optional(),
  S3_REGION: z.string().default('us-east-1'),
  S3_ENDPOINT: z.url().optional(),
  S3_ACCESS_KEY_ID: z.string().optional(),
  S3_SECRET_ACCESS_KEY: z.string().optional(),
});

export type Config = ReturnType<typeof readConfig>;

/** Reads the environment once. @throws Error with one sentence per setting that makes no sense */
export function readConfig(env: NodeJS.ProcessEnv) {
  const parsed = environment.safeParse(env);
  if (!parsed.success) {
    throw new Error(parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`).join(' '));
  }
  const e = parsed.data;
  const isLoopback = ['127.0.0.1', 'localhost', '::1'].includes(e.HOST);
  return {
    databaseUrl: e.DATABASE_URL,
    migrationUrl: e.DATABASE_MIGRATION_URL ?? e.DATABASE_URL,
    port: e.PORT,
    host: e.HOST,
    isLoopback,
    dataDir: e.DRIPRAIL_DATA,
    seedsDemo: e.DRIPRAIL_DEMO === '1',
    webDist: e.DRIPRAIL_WEB_DIST ?? null,
    startAt: e.DRIPRAIL_NOW ?? null,
    isTest: e.DRIPRAIL_TEST === '1',
    sessionSecret: e.SESSION_SECRET ?? null,
    smtpUrl: e.SMTP_URL ?? null,
    mailFrom: e.MAIL_FROM,
    publicUrl: e.PUBLIC_URL ?? null,
    s3: e.S3_BUCKET
      ? {
          bucket: e.S3_BUCKET,
          region: e.S3_REGION,
          endpoint: e.S3_ENDPOINT ?? null,
          credentials:
            e.S3_ACCESS_KEY_ID && e.S3_SECRET_ACCESS_KEY
              ? { accessKeyId: e.S3_ACCESS_KEY_ID, secretAccessKey: e.S3_SECRET_ACCESS_KEY }
              : null,
        }
      : null,
    push:
      e.VAPID_PUBLIC_KEY && e.VAPID_PRIVATE_KEY
        ? { publicKey: e.VAPID_PUBLIC_KEY, privateKey: e.VAPID_PRIVATE_KEY }
        : null,
    trustsProxy: e.TRUST_PROXY === '1',
    /** The page of the local mail fake exists only with the fake, on loopback. */
    hasLocalMail: !e.SMTP_URL && isLoopback,
  };
}
