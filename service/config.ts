import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import { availableParallelism } from "node:os";
import { z } from "zod";
import type { Key } from "./http/services.ts";
import type { Limits } from "./wire/limits.ts";
import { CEILINGS } from "./wire/limits.ts";

/** A setting that cannot be used: names the variable and says what would do, never the value of a key. */
class ConfigError extends Error {
  constructor(message: string) {
    super(message);
    this.name = "ConfigError";
  }
}

/** How the service runs. */
export interface Config {
  host: string;
  port: number;
  threads: number;
  queue: number;
  /** MiB of one worker's heap. */
  workerMemory: number;
  /** s during which a stopping service still takes requests. */
  drain: number;
  /** s after SIGTERM within which it ends. */
  grace: number;
  logLevel: string;
  limits: Limits;
  keys: Key[];
}

const whole = (low: number, high: number, fallback: number) =>
  z.coerce.number().int().min(low).max(high).default(fallback);
const seconds = (high: number, fallback: number) => z.coerce.number().min(0).max(high).default(fallback);
const lowered = (ceiling: number) => whole(1, ceiling, ceiling);

const Environment = z.object({
  HOST: z.string().min(1).default("127.0.0.1"),
  PORT: whole(0, 65_535, 8080),
  THREADS: whole(1, 256, availableParallelism()),
  QUEUE: whole(0, 100_000, 64),
  WORKER_MEMORY: whole(128, 65_536, 1024),
  DRAIN: seconds(600, 5),
  GRACE: seconds(3600, 70),
  LOG_LEVEL: z.enum(["fatal", "error", "warn", "info", "debug", "trace", "silent"]).default("info"),
  KNEEGAP_MAX_BODY_BYTES: lowered(CEILINGS.bodyBytes),
  KNEEGAP_MAX_SAMPLES: lowered(CEILINGS.samples),
  KNEEGAP_MAX_CANDIDATES: whole(2, CEILINGS.candidates, CEILINGS.candidates),
  KNEEGAP_MAX_CONTROL_PERIODS: lowered(CEILINGS.controlPeriods),
  KNEEGAP_MAX_COMPUTE_SECONDS: lowered(CEILINGS.computeSeconds),
  KNEEGAP_MAX_LINE_BYTES: lowered(CEILINGS.lineBytes),
  KNEEGAP_MAX_SITES: lowered(CEILINGS.sites),
  KNEEGAP_MAX_NAMED_CLIMATES: lowered(CEILINGS.namedClimates),
  KNEEGAP_MAX_NAMED_CLIMATE_BYTES: lowered(CEILINGS.namedClimateBytes),
  KNEEGAP_API_KEYS: z.string().default(""),
  KNEEGAP_API_KEYS_FILE: z.string().optional(),
  KNEEGAP_ALLOW_ANONYMOUS: z.enum(["true", "false"]).default("false"),
});

/**
 * The configuration out of environment variables (an empty one counts as not set).
 * @throws ConfigError naming every variable that will not do, or where the service would stand open to the network
 */
export function readConfig(environment: Readonly<Record<string, string | undefined>> = process.env): Config {
  const set = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== ""));
  const read = Environment.safeParse(set);
  if (!read.success) {
    const reasons = read.error.issues.map(({ path, message }) => `${path.join(".")}: ${message}`);
    throw new ConfigError(`These environment variables will not do: ${reasons.join("; ")}`);
  }
  const { data } = read;
  const keys = [...parseKeys(data.KNEEGAP_API_KEYS, "KNEEGAP_API_KEYS"), ...keysOfFile(data.KNEEGAP_API_KEYS_FILE)];
  refuseTwice(keys);
  refuseOpenDoor(data.HOST, keys, data.KNEEGAP_ALLOW_ANONYMOUS === "true");
  return {
    host: data.HOST,
    port: data.PORT,
    threads: data.THREADS,
    queue: data.QUEUE,
    workerMemory: data.WORKER_MEMORY,
    drain: data.DRAIN,
    grace: data.GRACE,
    logLevel: data.LOG_LEVEL,
    limits: {
      bodyBytes: data.KNEEGAP_MAX_BODY_BYTES,
      samples: data.KNEEGAP_MAX_SAMPLES,
      candidates: data.KNEEGAP_MAX_CANDIDATES,
      controlPeriods: data.KNEEGAP_MAX_CONTROL_PERIODS,
      computeSeconds: data.KNEEGAP_MAX_COMPUTE_SECONDS,
      lineBytes: data.KNEEGAP_MAX_LINE_BYTES,
      sites: data.KNEEGAP_MAX_SITES,
      namedClimates: data.KNEEGAP_MAX_NAMED_CLIMATES,
      namedClimateBytes: data.KNEEGAP_MAX_NAMED_CLIMATE_BYTES,
    },
    keys,
  };
}

/** The configuration, or one line on standard error and the end of the process with 1. */
export function configOrExit(): Config {
  try {
    return readConfig();
  } catch (error) {
    if (!(error instanceof ConfigError)) throw error;
    process.stderr.write(`kneegap does not start: ${error.message}\n`);
    process.exit(1);
  }
}

function keysOfFile(file: string | undefined): Key[] {
  if (file === undefined) return [];
  let text: string;
  try {
    text = readFileSync(file, "utf8");
  } catch (error) {
    throw new ConfigError(`KNEEGAP_API_KEYS_FILE cannot be read: ${(error as NodeJS.ErrnoException).code}`);
  }
  const keys = parseKeys(text, "KNEEGAP_API_KEYS_FILE");
  if (keys.length === 0) throw new ConfigError("KNEEGAP_API_KEYS_FILE holds no key.");
  return keys;
}

const ENTRY = /^([A-Za-z0-9._-]{1,64})=(?:sha256:([0-9a-fA-F]{64})|(?!sha256:)([\x21-\x7e]{16,512}))$/;

/** Entries `name=<key>` or `name=sha256:<hex>`, separated by commas or line breaks; lines that begin with # do not count. */
function parseKeys(text: string, variable: string): Key[] {
  const lines = text.split("\n").filter((line) => !line.trim().startsWith("#"));
  const entries = lines.flatMap((line) => line.split(",")).map((entry) => entry.trim());
  return entries
    .filter((entry) => entry !== "")
    .map((entry, index) => {
      const [, name, hash, key] = ENTRY.exec(entry) ?? [];
      if (name === undefined) {
        throw new ConfigError(
          `${variable}, entry ${index + 1}: write name=<key of 16 characters or more> or name=sha256:<64 hexadecimal digits>, the name of letters, digits, ".", "_" and "-".`,
        );
      }
      return {
        name,
        digest: hash === undefined ? createHash("sha256").update(key).digest() : Buffer.from(hash, "hex"),
      };
    });
}

function refuseTwice(keys: readonly Key[]): void {
  const twice = keys.find(({ name }, index) => keys.findIndex((other) => other.name === name) < index);
  if (twice !== undefined) throw new ConfigError(`Two keys are named ${twice.name}; give each its own name.`);
}

/** Without keys the service listens to its own machine only, unless that is what the operator wants. */
function refuseOpenDoor(host: string, keys: readonly Key[], anonymous: boolean): void {
  const loopback = host === "localhost" || host === "::1" || /^127(\.[0-9]{1,3}){3}$/.test(host);
  if (loopback || anonymous || keys.length > 0) return;
  throw new ConfigError(
    `Listening on ${host} without keys would let anyone in. Set KNEEGAP_API_KEYS or KNEEGAP_API_KEYS_FILE, or KNEEGAP_ALLOW_ANONYMOUS=true if that is meant, or HOST=127.0.0.1.`,
  );
}
