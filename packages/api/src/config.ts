import { z } from 'zod';
import type { PaymentsPlace } from './integrations/payments/payments.ts';

const flag = z.enum(['0', '1']).default('0');

const LOOPBACK = ['127.0.0.1', 'localhost', '::1', '[::1]'];

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
  /** Sign what a mail or text service posts back; without one its hook is off. */
  MAIL_WEBHOOK_SECRET: z.string().min(16).optional(),
  TEXTS_WEBHOOK_SECRET: z.string().min(16).optional(),
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
  /** Card payments go through this account; without it, through the local stand-in on loopback. */
  STRIPE_SECRET_KEY: z.string().optional(),
  STRIPE_WEBHOOK_SECRET: z.string().optional(),
  /** A stand-in that runs as a process of its own; for tests. */
  PAYMENTS_HOST: z
    .url({ protocol: /^https?$/, abort: true, error: 'give an address such as http://127.0.0.1:4690.' })
    .refine((text) => new URL(text).protocol === 'https:' || LOOPBACK.includes(new URL(text).hostname), {
      error: 'without https only this machine (http://127.0.0.1:PORT) may be named.',
    })
    .optional(),
});

export type Config = ReturnType<typeof readConfig>;

/** Reads the environment once. @throws Error with one sentence per setting that makes no sense */
export function readConfig(env: NodeJS.ProcessEnv) {
  const parsed = environment.safeParse(env);
  if (!parsed.success) {
    throw new Error(parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`).join(' '));
  }
  const e = parsed.data;
  const isLoopback = LOOPBACK.includes(e.HOST);
  const payments = paymentsPlace(e);
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
    hookSecrets: { mail: e.MAIL_WEBHOOK_SECRET ?? null, texts: e.TEXTS_WEBHOOK_SECRET ?? null },
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
    payments,
    /** Nobody beyond this machine can be shown the stand-in, or think that it took money. */
    hasLocalPayments: !payments && isLoopback && (!e.PUBLIC_URL || LOOPBACK.includes(new URL(e.PUBLIC_URL).hostname)),
    trustsProxy: e.TRUST_PROXY === '1',
    /** The page of the local mail fake exists only with the fake, on loopback. */
    hasLocalMail: !e.SMTP_URL && isLoopback,
  };
}

/** @throws Error when only a part of what card payments need is set */
function paymentsPlace(e: z.infer<typeof environment>): PaymentsPlace | null {
  const { STRIPE_SECRET_KEY: secretKey, STRIPE_WEBHOOK_SECRET: webhookSecret, PAYMENTS_HOST: host } = e;
  if (!secretKey && !webhookSecret && !host) return null;
  if (!secretKey) throw new Error('STRIPE_SECRET_KEY: set it too, or card payments can’t be asked for.');
  if (!webhookSecret) throw new Error('STRIPE_WEBHOOK_SECRET: set it too, or no card payment would ever be noted.');
  if (host && secretKey.startsWith('sk_live_')) {
    throw new Error('PAYMENTS_HOST: a live key may only be sent to the payment service itself.');
  }
  return { secretKey, webhookSecret, host: host ?? null };
}
