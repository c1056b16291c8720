import { createHash } from "node:crypto";
import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { describe, expect, it } from "vitest";
import { readConfig } from "../../service/config.ts";
import { CEILINGS } from "../../service/wire/limits.ts";

const KEY = "a-key-of-sixteen-characters-or-more";
const digest = createHash("sha256").update(KEY).digest();

describe("the configuration", () => {
  it("listens to its own machine on 8080 and admits the ceilings, unless told otherwise", () => {
    expect(readConfig({})).toMatchObject({ host: "127.0.0.1", port: 8080, drain: 5, limits: CEILINGS, keys: [] });
    expect(readConfig({ PORT: "", DRAIN: "0" })).toMatchObject({ port: 8080, drain: 0 });
  });

  it("takes keys in the clear and as SHA-256, and keeps only the digest", () => {
    const { keys } = readConfig({ KNEEGAP_API_KEYS: `quotes=${KEY}, planning=sha256:${digest.toString("hex")}` });
    expect(keys.map(({ name }) => name)).toEqual(["quotes", "planning"]);
    for (const key of keys) expect(Buffer.from(key.digest).equals(digest)).toBe(true);
    expect(JSON.stringify(keys)).not.toContain(KEY);
  });

  it("takes keys out of a file, whose comments do not count", async () => {
    const folder = await mkdtemp(join(tmpdir(), "kneegap-"));
    const file = join(folder, "keys");
    await writeFile(file, `# of the quoting tool\nquotes=${KEY}\n\n`);
    expect(readConfig({ KNEEGAP_API_KEYS_FILE: file }).keys).toHaveLength(1);
    await writeFile(file, "# none\n");
    expect(() => readConfig({ KNEEGAP_API_KEYS_FILE: file })).toThrow(/holds no key/);
    await rm(folder, { recursive: true });
    expect(() => readConfig({ KNEEGAP_API_KEYS_FILE: file })).toThrow(/cannot be read: ENOENT/);
  });

  it.each(["quotes", "quotes=short", "bad name=xxxxxxxxxxxxxxxxxxxx", "quotes=sha256:abc", `=${KEY}`])(
    "refuses the key entry %s without repeating it",
    (entry) => {
      expect(() => readConfig({ KNEEGAP_API_KEYS: entry })).toThrow(/entry 1: write name=/);
    },
  );

  it("refuses two keys of one name", () => {
    expect(() => readConfig({ KNEEGAP_API_KEYS: `a=${KEY},a=${KEY}2` })).toThrow(/Two keys are named a/);
  });

  it("refuses to stand open to the network without keys, unless that is meant", () => {
    for (const HOST of ["0.0.0.0", "::", "192.0.2.7", "example.org", "127.evil.example"]) {
      expect(() => readConfig({ HOST })).toThrow(/KNEEGAP_API_KEYS/);
      expect(readConfig({ HOST, KNEEGAP_ALLOW_ANONYMOUS: "true" }).host).toBe(HOST);
      expect(readConfig({ HOST, KNEEGAP_API_KEYS: `a=${KEY}` }).host).toBe(HOST);
    }
    for (const HOST of ["127.0.0.1", "127.1.2.3", "localhost", "::1"]) expect(readConfig({ HOST }).host).toBe(HOST);
  });

  it("lowers limits and never raises them", () => {
    expect(readConfig({ KNEEGAP_MAX_SAMPLES: "9000" }).limits.samples).toBe(9000);
    const portfolios = {
      KNEEGAP_MAX_LINE_BYTES: "1000",
      KNEEGAP_MAX_SITES: "20",
      KNEEGAP_MAX_NAMED_CLIMATES: "3",
      KNEEGAP_MAX_NAMED_CLIMATE_BYTES: "4000",
    };
    const lowered = { lineBytes: 1000, sites: 20, namedClimates: 3, namedClimateBytes: 4000 };
    expect(readConfig(portfolios).limits).toMatchObject(lowered);
    expect(() => readConfig({ KNEEGAP_MAX_SAMPLES: "600001" })).toThrow(/KNEEGAP_MAX_SAMPLES/);
    expect(() => readConfig({ KNEEGAP_MAX_CANDIDATES: "1" })).toThrow(/KNEEGAP_MAX_CANDIDATES/);
  });

  it("names every variable that will not do", () => {
    expect(() => readConfig({ PORT: "eighty", THREADS: "0", KNEEGAP_ALLOW_ANONYMOUS: "yes" })).toThrow(
      /PORT.*THREADS.*KNEEGAP_ALLOW_ANONYMOUS/,
    );
  });
});
