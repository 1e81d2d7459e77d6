import "server-only";
import { z } from "zod";

const flag = z.enum(["yes", "no"]).transform((value) => value === "yes");

const schema = z.object({
  NODE_ENV: z.enum(["development", "test", "production"]).default("development"),
  DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }),
  /** Upper bound of database connections held by one process. */
  DATABASE_POOL: z.coerce.number().int().min(1).max(100).default(10),
  NEXTAUTH_URL: z.url({ protocol: /^https?$/ }),
  NEXTAUTH_SECRET: z.string().min(32),
  /** "yes" when a proxy that writes x-forwarded-for stands before the server and nobody can pass it by. */
  TRUST_PROXY: flag.default(false),
  S3_ENDPOINT: z.url({ protocol: /^https?$/ }).optional(),
  S3_REGION: z.string().min(1).default("us-east-1"),
  S3_BUCKET: z.string().min(3),
  S3_ACCESS_KEY_ID: z.string().min(1),
  S3_SECRET_ACCESS_KEY: z.string().min(1),
  /** "yes" puts the bucket in the path instead of the host name, as most self-run stores need it. */
  S3_FORCE_PATH_STYLE: flag.default(true),
  SMTP_URL: z.url({ protocol: /^smtps?$/ }),
  MAIL_FROM: z.string().min(3).default("Ferrule <ferrule@localhost>"),
});

/** Settings of the running process, checked. */
export type Environment = z.infer<typeof schema>;

let checked: Environment | undefined;

/**
 * Settings of the running process, read and checked on first use; a build has none, so nothing
 * may ask at import time. An empty setting counts as absent.
 * @throws Error naming every setting that is missing or wrong, without showing values.
 */
export function env(): Environment {
  return (checked ??= read(schema));
}

const databaseSchema = schema.pick({ DATABASE_URL: true, DATABASE_POOL: true });

/** Settings of the database alone, for scripts that need nothing else. @throws Error as `env` */
export const databaseEnv = (): z.infer<typeof databaseSchema> => checked ?? read(databaseSchema);

function read<Settings>(wanted: z.ZodType<Settings>): Settings {
  const given = Object.fromEntries(Object.entries(process.env).filter(([, value]) => value !== ""));
  const result = wanted.safeParse(given);
  if (result.success) return result.data;
  const problems = result.error.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`);
  throw new Error(`Settings are missing or wrong (see .env.example): ${problems.join("; ")}`);
}
