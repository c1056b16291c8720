import { describe, expect, it } from "vitest";
import type { ClimateFileErrorCode, ReadClimateOptions } from "../../sdk/src/index.ts";
import { ClimateFileError, readClimate } from "../../sdk/src/index.ts";

type Options = ReadClimateOptions<object, "refuse">;

const HEADER = "time;plane of array irradiance [W/m2];cell temperature [degC]\n";
const STARTED: Options = { start: "2025-01-01T00:00Z", step: 60 };
const rows = (...lines: string[]) => HEADER + lines.map((line) => `${line}\n`).join("");
/** Hourly rows whose clock shows `times` of one day and says no offset. */
const clock = (day: string, ...times: string[]) => rows(...times.map((time) => `${day} ${time};1;5`));
const values = (...lines: string[]) =>
  `plane of array irradiance;cell temperature\n${lines.map((line) => `${line}\n`).join("")}`;

interface Fault {
  readonly code: ClimateFileErrorCode;
  readonly at: readonly [line: number | null, column: number | null];
  readonly found: string | null;
  /** What the message says to change, or the likely reason. */
  readonly says: RegExp;
}

/** Lines and columns were counted by hand. */
const FAULTS: readonly [what: string, text: string, options: Options, fault: Fault][] = [
  ["an empty file", "\n\n# nothing\n", {}, { code: "no-samples", at: [null, null], found: null, says: /it is empty/ }],
  ["a header alone", HEADER, {}, { code: "no-samples", at: [1, null], found: null, says: /no row follows/ }],
  [
    "a header line past the end",
    HEADER,
    { headerLine: 3 },
    { code: "no-samples", at: [null, null], found: null, says: /before its header/ },
  ],
  [
    "more samples than allowed",
    values("1;5", "2;5", "3;5"),
    { ...STARTED, maximumSamples: 2 },
    { code: "too-many-samples", at: [4, null], found: null, says: /more than 2 samples.*split/ },
  ],
  [
    "more filled samples than allowed",
    rows("2025-01-01T00:00Z;1;5", "2025-01-01T00:01Z;1;5", "2099-01-01T00:00Z;1;5"),
    { fillMissingRows: true },
    { code: "too-many-samples", at: [4, null], found: null, says: /600000 samples \(\d+ rows are missing/ },
  ],
  [
    "a line without end",
    `${HEADER}\n2025-01-01T00:00Z;1;${"5".repeat(70_000)}`,
    {},
    { code: "line-too-long", at: [3, null], found: null, says: /65536 characters/ },
  ],
  [
    "a header without end",
    `#\n${"x".repeat(70_000)}`,
    {},
    { code: "line-too-long", at: [2, null], found: null, says: /65536 characters/ },
  ],
  [
    "a quote left open",
    rows("2025-01-01T00:00Z;1;5", "", "# c", '2025-01-01T01:00Z;"1;5', "2025-01-01T02:00Z;1;5"),
    {},
    { code: "quote", at: [5, 2], found: null, says: /never closed/ },
  ],
  [
    "a quote inside a field",
    rows('2025-01-01T00:00Z;1 "dim";5'),
    {},
    { code: "quote", at: [2, 2], found: null, says: /double the quotes/ },
  ],
  [
    "text behind a quote",
    rows('2025-01-01T00:00Z;1;"5"6'),
    {},
    { code: "quote", at: [2, 3], found: null, says: /inside a field/ },
  ],

  [
    "no time",
    values("1;5"),
    {},
    {
      code: "column-missing",
      at: [1, null],
      found: null,
      says: /"time".*start and step.*"plane of array irradiance", "cell temperature"/,
    },
  ],
  [
    "no irradiance",
    "time;light;cell temperature\n",
    {},
    {
      code: "column-missing",
      at: [1, null],
      found: null,
      says: /an irradiance: "plane of array irradiance \[W\/m2\]".*"light"/,
    },
  ],
  [
    "direct irradiance alone",
    "time;direct normal irradiance;cell temperature\n",
    { site: {} },
    {
      code: "column-missing",
      at: [1, null],
      found: null,
      says: /second horizontal component: "global horizontal irradiance/,
    },
  ],
  [
    "no temperature",
    "time;plane of array irradiance;wind speed\n",
    {},
    {
      code: "column-missing",
      at: [1, null],
      found: null,
      says: /a temperature: "cell temperature \[degC\]" or "ambient/,
    },
  ],
  [
    "horizontal irradiance without a site",
    "cell temperature;time;global horizontal irradiance\n",
    {},
    { code: "site-missing", at: [1, 3], found: "global horizontal irradiance", says: /option site/ },
  ],
  [
    "a misspelt header",
    "time;plane of aray irradiance [W/m2];cell temperature\n",
    {},
    {
      code: "column-unknown",
      at: [1, 2],
      found: "plane of aray irradiance [W/m2]",
      says: /did you mean "plane of array irradiance \[W\/m2\]"/,
    },
  ],
  [
    "a misspelt header nothing depends on",
    "time;plane of array irradiance;ambient temperature;wind sped\n",
    {},
    { code: "column-unknown", at: [1, 4], found: "wind sped", says: /did you mean "wind speed \[m\/s\]"/ },
  ],
  [
    "a mapped header that is not there",
    "\ntime;irradiance;temp\n",
    { columns: { time: "time", planeOfArray: "irradance", cellTemperature: "temp" } },
    {
      code: "column-unknown",
      at: [2, null],
      found: null,
      says: /"irradance", which is not in the header: "time", "irradiance", "temp"\. Did you mean "irradiance"/,
    },
  ],
  [
    "a mapped number past the row",
    "a;b\n",
    { columns: { time: 1, planeOfArray: 2, cellTemperature: 3 } },
    { code: "column-unknown", at: [1, null], found: null, says: /column 3, but the row has 2/ },
  ],
  [
    "a mapped header that is there twice",
    "time;g;t;G\n",
    { columns: { time: "time", planeOfArray: "g", cellTemperature: "t" } },
    { code: "column-repeated", at: [1, 4], found: "G", says: /column 2 has the same header.*number/ },
  ],
  [
    "two roles mapped to one column",
    "time;g\n",
    { columns: { time: "time", planeOfArray: "g", cellTemperature: 2 } },
    { code: "column-repeated", at: [1, 2], found: "g", says: /both as plane of array irradiance/ },
  ],
  [
    "two columns of one role",
    "time;cell temperature;plane of array irradiance;Cell Temperature [°C]\n",
    {},
    {
      code: "column-repeated",
      at: [1, 4],
      found: "Cell Temperature [°C]",
      says: /column 2 is cell temperature \[degC\] too/,
    },
  ],
  [
    "two kinds of irradiance",
    "time;global horizontal irradiance;plane of array irradiance;cell temperature\n",
    { site: {} },
    { code: "column-repeated", at: [1, 3], found: "plane of array irradiance", says: /has both.*option columns/ },
  ],
  [
    "two kinds of temperature",
    "time;plane of array irradiance;cell temperature;ambient temperature\n",
    {},
    { code: "column-repeated", at: [1, 4], found: "ambient temperature", says: /has both.*option columns/ },
  ],
  [
    "a time column beside a start",
    rows("2025-01-01T00:00Z;1;5"),
    STARTED,
    { code: "column-repeated", at: [1, 1], found: "time", says: /leave out the option start/ },
  ],
  [
    "another unit",
    "time;plane of array irradiance [kW/m2];cell temperature\n",
    {},
    {
      code: "unit",
      at: [1, 2],
      found: "plane of array irradiance [kW/m2]",
      says: /read as plane of array irradiance \[W\/m2\]; convert/,
    },
  ],
  [
    "a kelvin column",
    "time;plane of array irradiance;cell temperature (K)\n",
    {},
    { code: "unit", at: [1, 3], found: "cell temperature (K)", says: /\[degC\]; convert/ },
  ],

  [
    "a row cut short",
    rows("2025-01-01T00:00Z;1;5", "2025-01-01T01:00Z;1"),
    {},
    { code: "row-too-short", at: [3, 3], found: null, says: /2 of 3 fields.*cut off/ },
  ],
  [
    "decimal commas between commas",
    "time,plane of array irradiance,cell temperature\n2025-01-01T00:00Z,0,5,21,5\n",
    {},
    { code: "row-too-long", at: [2, 4], found: "21", says: /5 fields, 3 were expected; a decimal comma/ },
  ],
  [
    "a text for a number",
    rows("2025-01-01T00:00Z;bright;5"),
    {},
    { code: "number", at: [2, 2], found: "bright", says: /not a number; write digits/ },
  ],
  [
    "a number with its unit",
    values("800 W;5"),
    STARTED,
    { code: "number", at: [2, 1], found: "800 W", says: /digits alone/ },
  ],
  [
    "a hexadecimal number",
    values("0x10;5"),
    STARTED,
    { code: "number", at: [2, 1], found: "0x10", says: /digits alone/ },
  ],
  [
    "a word for missing",
    values("800;5", "800;NaN"),
    STARTED,
    { code: "number", at: [3, 2], found: "NaN", says: /missing: \["NaN"\]/ },
  ],
  [
    "a number for missing",
    values("-9999.9;5"),
    STARTED,
    { code: "number", at: [2, 1], found: "-9999.9", says: /no irradiance.*missing: \["-9999\.9"\]/ },
  ],
  [
    "a number past all doubles",
    values("1e999;5"),
    STARTED,
    { code: "number", at: [2, 1], found: "1e999", says: /no irradiance/ },
  ],
  [
    "thousands separators beside decimals",
    values("1.234,5;5"),
    STARTED,
    { code: "number", at: [2, 1], found: "1.234,5", says: /leave out the thousands separators/ },
  ],
  [
    "bytes of another encoding",
    values("5\uFFFD;5"),
    STARTED,
    { code: "number", at: [2, 1], found: "5\uFFFD", says: /not UTF-8.*option encoding/ },
  ],
  [
    "a long text, shortened",
    values(`${"bright ".repeat(20)};5`),
    STARTED,
    { code: "number", at: [2, 1], found: `${"bright ".repeat(20).slice(0, 40)}…`, says: /not a number/ },
  ],
  [
    "a decimal comma among points",
    values("0.5;5", "1;5", "0,25;5"),
    STARTED,
    {
      code: "decimal-mark",
      at: [4, 1],
      found: "0,25",
      says: /decimal points \("0\.5" on line 2\); write this number in the same way\.$/,
    },
  ],
  [
    "a thousands separator among points",
    values("0.5;5", "1,250;5"),
    STARTED,
    { code: "decimal-mark", at: [3, 1], found: "1,250", says: /or leave out the "," if it separates thousands/ },
  ],
  [
    "a decimal point among commas",
    values("5;0,5", "5;0.25"),
    STARTED,
    { code: "decimal-mark", at: [3, 2], found: "0.25", says: /decimal commas \("0,5" on line 2\)/ },
  ],
  [
    "another mark than given",
    values("0,5;5"),
    { ...STARTED, decimal: "." },
    { code: "decimal-mark", at: [2, 1], found: "0,5", says: /by the option decimal the file has decimal points/ },
  ],
  [
    "commas that may be either",
    values("1,250;5", "1,300;6"),
    STARTED,
    {
      code: "decimal-mark",
      at: [2, 1],
      found: "1,250",
      says: /may be a decimal mark or a thousands separator.*decimal: ","/,
    },
  ],
  [
    "a comma that a later point explains",
    values("1,250;5", "800;6.5"),
    STARTED,
    {
      code: "decimal-mark",
      at: [2, 1],
      found: "1,250",
      says: /6\.5 on line 3 has a decimal point, so this comma separates thousands/,
    },
  ],

  [
    "a day before its month",
    rows("01.02.2025 00:00;1;5"),
    {},
    { code: "time", at: [2, 1], found: "01.02.2025 00:00", says: /ISO 8601.*2025-01-01T00:00:00\+01:00/ },
  ],
  [
    "a day without a time",
    rows("2025-01-01;1;5"),
    {},
    { code: "time", at: [2, 1], found: "2025-01-01", says: /ISO 8601/ },
  ],
  [
    "no time in a row",
    rows("2025-01-01T00:00Z;1;5", ";;"),
    {},
    { code: "time", at: [3, 1], found: "", says: /no time; write it, or delete/ },
  ],
  [
    "a day that is not",
    rows("2025-02-29T00:00Z;1;5"),
    {},
    { code: "time", at: [2, 1], found: "2025-02-29T00:00Z", says: /no such day/ },
  ],
  [
    "an hour that is not",
    rows("2025-02-28T24:01Z;1;5"),
    {},
    { code: "time", at: [2, 1], found: "2025-02-28T24:01Z", says: /no such time/ },
  ],
  [
    "an offset that is not",
    rows("2025-02-28T00:00+15:00;1;5"),
    {},
    { code: "time", at: [2, 1], found: "2025-02-28T00:00+15:00", says: /no such offset/ },
  ],
  [
    "a year out of bounds",
    rows("1925-02-28T00:00Z;1;5"),
    {},
    { code: "time", at: [2, 1], found: "1925-02-28T00:00Z", says: /1950 to 2099/ },
  ],
  [
    "no offset anywhere",
    clock("2025-01-01", "00:00"),
    {},
    { code: "utc-offset", at: [2, 1], found: "2025-01-01 00:00", says: /utcOffset, such as "\+01:00"/ },
  ],
  [
    "one row without a step",
    rows("2025-01-01T00:00Z;1;5"),
    {},
    { code: "spacing", at: [2, 1], found: "2025-01-01T00:00Z", says: /option step/ },
  ],
  [
    "a stamp repeated",
    clock("2025-01-01", "00:00", "01:00", "01:00"),
    { utcOffset: "Z" },
    { code: "spacing", at: [4, 1], found: "2025-01-01 01:00", says: /repeats the stamp of line 3/ },
  ],
  [
    "the first stamp repeated",
    clock("2025-01-01", "00:00", "00:00"),
    { utcOffset: "Z" },
    { code: "spacing", at: [3, 1], found: "2025-01-01 00:00", says: /repeats the stamp of line 2/ },
  ],
  [
    "a row missing",
    clock("2025-01-01", "00:00", "01:00", "03:00"),
    { utcOffset: "+01:00" },
    {
      code: "spacing",
      at: [4, 1],
      found: "2025-01-01 03:00",
      says: /7200 s after line 3, where 3600 s were expected: 1 row is missing.*fillMissingRows/,
    },
  ],
  [
    "rows out of order",
    clock("2025-01-01", "02:00", "03:00", "00:00"),
    { utcOffset: "+01:00" },
    { code: "spacing", at: [4, 1], found: "2025-01-01 00:00", says: /10800 s before line 3; sort/ },
  ],
  [
    "rows from the last to the first",
    clock("2025-01-01", "02:00", "01:00"),
    { utcOffset: "+01:00" },
    { code: "spacing", at: [3, 1], found: "2025-01-01 01:00", says: /before line 2; sort/ },
  ],
  [
    "uneven rows",
    clock("2025-01-01", "00:00", "01:00", "02:01"),
    { utcOffset: "+01:00" },
    { code: "spacing", at: [4, 1], found: "2025-01-01 02:01", says: /equally spaced; resample/ },
  ],
  [
    "uneven rows, where others may be filled",
    clock("2025-01-01", "00:00", "01:00", "02:01"),
    { utcOffset: "Z", fillMissingRows: true },
    { code: "spacing", at: [4, 1], found: "2025-01-01 02:01", says: /equally spaced; resample/ },
  ],
  [
    "a step that grows shorter",
    clock("2025-01-01", "00:00", "02:00", "03:00"),
    { utcOffset: "Z" },
    { code: "spacing", at: [4, 1], found: "2025-01-01 03:00", says: /missing above.*option step/ },
  ],
  [
    "another step than given",
    clock("2025-01-01", "00:00", "00:30"),
    { utcOffset: "Z", step: 3600 },
    { code: "spacing", at: [3, 1], found: "2025-01-01 00:30", says: /1800 s after line 2, where 3600 s were expected/ },
  ],
  [
    "a step past a day",
    rows("2025-01-01T00:00Z;1;5", "2025-01-03T00:00Z;1;5"),
    {},
    { code: "spacing", at: [3, 1], found: "2025-01-03T00:00Z", says: /1 s to 1 day/ },
  ],
  // The European Union's clocks changed on Sunday 30 March and Sunday 26 October 2025, at 01:00 UTC.
  [
    "the clock put forward",
    clock("2025-03-30", "00:00", "01:00", "03:00"),
    { utcOffset: "+01:00" },
    {
      code: "clock-change",
      at: [4, 1],
      found: "2025-03-30 03:00",
      says: /forward to daylight saving time.*own offset/,
    },
  ],
  [
    "the clock put forward, where rows may be filled",
    clock("2025-03-30", "00:00", "01:00", "03:00"),
    { utcOffset: "+01:00", fillMissingRows: true },
    { code: "clock-change", at: [4, 1], found: "2025-03-30 03:00", says: /daylight saving/ },
  ],
  [
    "the clock put back",
    clock("2025-10-26", "01:00", "02:00", "02:00"),
    { utcOffset: "+01:00" },
    { code: "clock-change", at: [4, 1], found: "2025-10-26 02:00", says: /back from daylight saving time/ },
  ],
  [
    "the clock put back between quarters of an hour",
    clock("2025-10-26", "02:30", "02:45", "02:00"),
    { utcOffset: "+01:00" },
    {
      code: "clock-change",
      at: [4, 1],
      found: "2025-10-26 02:00",
      says: /goes on by -2700 s instead of 900 s.*back from/,
    },
  ],
];

describe("readClimate refuses, with line and column,", () => {
  it.each(FAULTS)("%s", async (_, text, options, { code, at: [line, column], found, says }) => {
    const error = await readClimate(text, options).catch((thrown: unknown) => thrown);
    expect(error).toBeInstanceOf(ClimateFileError);
    expect(error).toMatchObject({ name: "ClimateFileError", code, line, column, found });
    const { message, reason } = error as ClimateFileError;
    expect(reason).toMatch(says);
    const where = line === null ? "The file" : column === null ? `Line ${line}` : `Line ${line}, column ${column}`;
    expect(message).toBe(`${where}${found === null ? "" : `, ${JSON.stringify(found)}`}: ${reason}`);
  });

  it("in a file that breaks its lines within quotes and by CRLF", async () => {
    const text =
      '"time";"plane of array\r\nirradiance";cell temperature\r\n\r\n2025-01-01T00:00Z;1;5\r\n2025-01-01T01:00Z;x;5\r\n';
    await expect(readClimate(text)).rejects.toMatchObject({ code: "number", line: 5, column: 2, found: "x" });
  });

  it("below a preamble", async () => {
    const text = `"\n\nstation\n${HEADER}2025-01-01T00:00Z;1;x\n`;
    await expect(readClimate(text, { headerLine: 4 })).rejects.toMatchObject({ code: "number", line: 5, column: 3 });
  });

  it("a file in Latin-1 whose degree sign it needs", async () => {
    const bytes = new Uint8Array(Buffer.from("time;plane of array irradiance;cell temperature [°C]\n", "latin1"));
    await expect(readClimate(bytes)).rejects.toMatchObject({
      code: "unit",
      line: 1,
      column: 3,
      reason: expect.stringContaining("option encoding, such as windows-1252"),
    });
  });
});

describe("readClimate refuses options", () => {
  it.each<[what: string, options: object, error: ErrorConstructor, says: RegExp]>([
    [
      "a role it does not know",
      { columns: { temperature: 1 } },
      TypeError,
      /a member of columns must be "time" or "planeOfArray"/,
    ],
    ["a column number 0", { columns: { time: 0 } }, RangeError, /columns\.time must be a number from 1 to/],
    [
      "a column that is neither",
      { columns: { time: true } },
      TypeError,
      /columns\.time must be a header or a column's number/,
    ],
    [
      "wind beside cell temperature",
      { columns: { cellTemperature: 1, windSpeed: 2 } },
      TypeError,
      /windSpeed goes with ambientTemperature/,
    ],
    [
      "headers of a file without any",
      { headerLine: null, columns: { time: "time" } },
      TypeError,
      /columns\.time must be a number/,
    ],
    [
      "no columns for a file without headers",
      { headerLine: null },
      TypeError,
      /headerLine null needs the option columns/,
    ],
    ["a header line 0", { headerLine: 0 }, RangeError, /headerLine/],
    ["a delimiter of two characters", { delimiter: "::" }, TypeError, /delimiter must be one character/],
    ["a digit for a delimiter", { delimiter: "1" }, TypeError, /delimiter must be one character/],
    ["another decimal mark", { decimal: "'" }, TypeError, /decimal must be "\." or ","/],
    ["an empty comment mark", { comment: "" }, TypeError, /comment must be/],
    ["a missing text that is no array", { missing: "NaN" }, TypeError, /missing must be an array/],
    ["a missing number", { missing: [-9999] }, TypeError, /missing must be an array of texts/],
    ["a zone's name for its offset", { utcOffset: "CET" }, TypeError, /utcOffset must be an offset such as "\+01:00"/],
    ["other stamps", { stamps: "middle" }, TypeError, /stamps must be "start" or "end"/],
    ["another timing", { timing: "sum" }, TypeError, /timing must be "mean" or "instant"/],
    ["end stamps of instants", { stamps: "end", timing: "instant" }, TypeError, /an instant has no end/],
    ["a start without a step", { start: "2025-01-01T00:00Z" }, TypeError, /start needs the option step/],
    ["a start without an offset", { start: "2025-01-01T00:00", step: 60 }, TypeError, /start must carry its offset/],
    ["a start that is no time", { start: "today", step: 60 }, TypeError, /start "today": .*ISO 8601/],
    ["a step of 0", { step: 0 }, RangeError, /step must be a number from 1 to 86400/],
    ["more samples than the service takes", { maximumSamples: 600_001 }, RangeError, /maximumSamples/],
    ["an encoding nobody knows", { encoding: "runes" }, RangeError, /runes/],
  ])("%s", async (_, options, error, says) => {
    const refusal = await readClimate(new Uint8Array([10]), options).catch((thrown: unknown) => thrown);
    expect(refusal).toBeInstanceOf(error);
    expect((refusal as Error).message).toMatch(says);
  });

  it.each([[5], [null], [{}], [[5]]])("and text that is none: %j", async (text) => {
    await expect(readClimate(text as never)).rejects.toThrow(TypeError);
  });
});
