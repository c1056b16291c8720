import { describe, expect, it } from "vitest";
import type { Climate, Sent } from "../../sdk/src/index.ts";
import { readClimate } from "../../sdk/src/index.ts";

// Every expected value stands, as written by hand, in the CSV text beside it; times follow from the calendar.

const site = { latitude: 53.4, longitude: 8.1, elevation: 2, tilt: 30, azimuth: 180 };
const doubles = (...values: number[]) => Float64Array.of(...values);

describe("readClimate", () => {
  it("reads the documented headers of plane of array irradiance and cell temperature", async () => {
    const text = `time,plane of array irradiance [W/m2],cell temperature [degC]
2025-06-01T10:00:00+01:00,420.5,31
2025-06-01T11:00:00+01:00,610,38.25
2025-06-01T12:00:00+01:00,780,
`;
    // The type says that what was read may be sent as it is.
    const climate: Sent<Climate> = await readClimate(text);
    expect(climate).toEqual({
      start: "2025-06-01T10:00:00+01:00",
      step: 3600,
      timing: "mean",
      gaps: "refuse",
      irradiance: { kind: "plane-of-array", values: doubles(420.5, 610, 780) },
      temperature: { kind: "cell", values: doubles(31, 38.25, Number.NaN) },
    });
  });

  it("reads the documented headers of the horizontal components, air and wind, with the site handed on", async () => {
    const text = `time,global horizontal irradiance [W/m2],direct normal irradiance [W/m2],diffuse horizontal irradiance [W/m2],ambient temperature [degC],wind speed [m/s]
2025-06-01T10:00Z,300,410,120,-1.5,2
2025-06-01T10:10Z,305,415,121,-1.25,2.5
`;
    const climate = await readClimate(text, { site, timing: "instant", gaps: { interpolateUpTo: 1800 } });
    expect(climate).toEqual({
      start: "2025-06-01T10:00:00+00:00",
      step: 600,
      timing: "instant",
      gaps: { interpolateUpTo: 1800 },
      irradiance: {
        kind: "horizontal",
        global: doubles(300, 305),
        directNormal: doubles(410, 415),
        diffuse: doubles(120, 121),
        site,
      },
      temperature: { kind: "ambient", values: doubles(-1.5, -1.25), windSpeed: doubles(2, 2.5) },
    });
  });

  it.each([
    ["global", "global horizontal irradiance"],
    ["global and diffuse", "global horizontal irradiance,diffuse horizontal irradiance"],
    ["direct and diffuse", "direct normal irradiance,diffuse horizontal irradiance"],
  ])("is content with %s alone", async (_, headers) => {
    const values = headers.split(",").map((_header, index) => 100 + index);
    const text = `time,${headers},cell temperature\n2025-01-01T00:00Z,${values},5\n`;
    const { irradiance } = await readClimate(text, { site, step: 60 });
    expect(Object.values(irradiance)).toEqual(["horizontal", ...values.map((value) => doubles(value)), site]);
  });

  it("passes over case, blanks, underscores and hyphens of headers, columns it does not know, and wind beside cell temperature", async () => {
    const text = `Record;TIME;  Plane-of-Array_irradiance (W/m²);Humidity [%];CELL TEMPERATURE [°C];wind speed
a;2025-01-01T00:00Z;1;80;5;3
b;2025-01-01T00:01Z;2;n/a;6;3
`;
    const { irradiance, temperature } = await readClimate(text);
    expect(irradiance).toEqual({ kind: "plane-of-array", values: doubles(1, 2) });
    expect(temperature).toEqual({ kind: "cell", values: doubles(5, 6) });
  });

  it("reads the columns a mapping names by header or by number, and no others", async () => {
    const text = `Zeit;time;Strahlung;global horizontal irradiance;T
2025-01-01T00:00Z;x;1;;5
2025-01-01T00:01Z;y;2;;6
`;
    const { step, irradiance, temperature } = await readClimate(text, {
      columns: { time: "zeit", planeOfArray: 3, ambientTemperature: "T" },
    });
    expect(step).toBe(60);
    expect(irradiance).toEqual({ kind: "plane-of-array", values: doubles(1, 2) });
    expect(temperature).toEqual({ kind: "ambient", values: doubles(5, 6) });
  });

  it("reads a file without headers by the columns' numbers", async () => {
    const climate = await readClimate("800;41\n;42\n", {
      headerLine: null,
      columns: { planeOfArray: 1, cellTemperature: 2 },
      start: "2025-01-01T00:00:00+01:00",
      step: 900,
    });
    expect(climate.start).toBe("2025-01-01T00:00:00+01:00");
    expect(climate.step).toBe(900);
    expect(climate.irradiance).toEqual({ kind: "plane-of-array", values: doubles(800, Number.NaN) });
    expect(climate.temperature).toEqual({ kind: "cell", values: doubles(41, 42) });
  });

  it("finds the header on the line it is told", async () => {
    const text = `Landing stage 4, "east
time,units
time,plane of array irradiance,cell temperature
2025-01-01T00:00Z,1,5
`;
    const { irradiance } = await readClimate(text, { headerLine: 3, step: 60 });
    expect(irradiance).toEqual({ kind: "plane-of-array", values: doubles(1) });
  });

  it("lets pass empty fields too many at the ends of rows, as spreadsheets write them", async () => {
    const text = "plane of array irradiance;cell temperature\n1;5;;\n2;6\n";
    const { irradiance } = await readClimate(text, { start: "2025-01-01T00:00Z", step: 60 });
    expect(irradiance).toEqual({ kind: "plane-of-array", values: doubles(1, 2) });
  });
});

describe("readClimate finds the dialect", () => {
  const expected = {
    irradiance: { kind: "plane-of-array", values: doubles(0.5, 1234.25, -2) },
    temperature: { kind: "cell", values: doubles(21, 1.125, -3.5) },
  };
  const columns = { time: "t", planeOfArray: "g", cellTemperature: "tc" };

  it.each([
    [
      "commas, decimal points",
      "t,g,tc\n2025-01-01T00:00Z,0.5,21\n2025-01-01T00:01Z,1234.25,1.125\n2025-01-01T00:02Z,-2,-3.5\n",
    ],
    [
      "semicolons, decimal commas, CRLF",
      "t;g;tc\r\n2025-01-01T00:00Z;0,5;21\r\n2025-01-01T00:01Z;1234,25;1,125\r\n2025-01-01T00:02Z;-2;-3,5\r\n",
    ],
    [
      "commas, quoted decimal commas",
      't,g,tc\n2025-01-01T00:00Z,"0,5",21\n2025-01-01T00:01Z,"1234,25","1,125"\n2025-01-01T00:02Z,-2,"-3,5"\n',
    ],
    [
      "tabs, a byte order mark, CR alone, no last line end",
      "\uFEFFt\tg\ttc\r2025-01-01T00:00Z\t.5\t21\r2025-01-01T00:01Z\t1234.25\t1.125\r2025-01-01T00:02Z\t-2.\t-35e-1",
    ],
    [
      "runs of blanks, a quoted stamp",
      '  t     g  tc\n"2025-01-01 00:00Z"  0,5  21\n"2025-01-01 00:01Z" 1234,25\t1,125 \n2025-01-01T00:02Z  -2  -3,5\n',
    ],
    [
      "comments, empty lines, blanks around fields, quoted headers over two lines",
      '# made up\n\n"t" ; "g"\t;"tc"\n2025-01-01T00:00Z ; +0,5 ; "21"\n#\n \n2025-01-01T00:01Z;1234,25; 1,125\n2025-01-01T00:02Z;-2;"-3,5"\n',
    ],
    [
      "a first comma that only a later one explains",
      "g;tc;t\n0;21;2025-01-01T00:00Z\n1;1,125;2025-01-01T00:01Z\n2;-3,5;2025-01-01T00:02Z\n",
      { irradiance: { kind: "plane-of-array", values: doubles(0, 1, 2) }, temperature: expected.temperature },
    ],
  ] as const)("%s", async (_, text, result: object = expected) => {
    expect(await readClimate(text, { columns })).toMatchObject({
      start: "2025-01-01T00:00:00+00:00",
      step: 60,
      ...result,
    });
  });

  it("or takes it as given", async () => {
    const text = "% made up\nplane of array irradiance|cell temperature\n1,234|5,678\n";
    const options = { delimiter: "|", decimal: ",", comment: "%", start: "2025-01-01T00:00Z", step: 60 } as const;
    const { irradiance, temperature } = await readClimate(text, options);
    expect(irradiance).toEqual({ kind: "plane-of-array", values: doubles(1.234) });
    expect(temperature).toEqual({ kind: "cell", values: doubles(5.678) });
  });

  it("and the encoding of UTF-16 by its mark, of others when told", async () => {
    const text = "time;plane of array irradiance;cell temperature [°C]\n2025-01-01T00:00Z;1;5\n";
    const expectedValues = { kind: "cell", values: doubles(5) };
    const utf16 = new Uint8Array(Buffer.from(`\uFEFF${text}`, "utf16le"));
    const latin1 = new Uint8Array(Buffer.from(text, "latin1"));
    expect((await readClimate(utf16, { step: 60 })).temperature).toEqual(expectedValues);
    expect((await readClimate(latin1, { step: 60, encoding: "windows-1252" })).temperature).toEqual(expectedValues);
  });
});

describe("readClimate understands missing values", () => {
  const read = (text: string, missing?: string[]) =>
    readClimate(`plane of array irradiance;cell temperature\n${text}`, {
      start: "2025-01-01T00:00Z",
      step: 60,
      missing,
    });

  it("as empty fields and as the texts and numbers given, whatever the decimal mark", async () => {
    const { irradiance, temperature } = await read('NaN;""\n-9999,90;1,5\n -9999.9 ;-\n7; \n', ["NaN", "-9999.9", "-"]);
    expect(irradiance).toEqual({
      kind: "plane-of-array",
      values: doubles(Number.NaN, Number.NaN, Number.NaN, 7),
    });
    expect(temperature).toEqual({ kind: "cell", values: doubles(Number.NaN, 1.5, Number.NaN, Number.NaN) });
  });
});

describe("readClimate understands time", () => {
  const read = (stamps: string[], options: object = {}) =>
    readClimate(
      `time;plane of array irradiance;cell temperature\n${stamps.map((stamp, row) => `${stamp};${row};5\n`).join("")}`,
      options,
    );

  it.each([
    [
      "seconds and milliseconds",
      ["2025-01-01T00:00:00.500Z", "2025-01-01T00:00:02,000Z"],
      {},
      "2025-01-01T00:00:00.500+00:00",
      1.5,
    ],
    ["offsets behind UTC", ["2025-01-01T00:00-0330", "2025-01-01T01:00-0330"], {}, "2025-01-01T00:00:00-03:30", 3600],
    [
      "the offset given",
      ["2025-01-01 00:00", "2025-01-01 00:30"],
      { utcOffset: "+05:45" },
      "2025-01-01T00:00:00+05:45",
      1800,
    ],
    [
      "24:00 as the end of a day",
      ["2024-02-29T23:00Z", "2024-02-29T24:00Z", "2024-03-01T01:00Z"],
      {},
      "2024-02-29T23:00:00+00:00",
      3600,
    ],
    [
      "the hour put forward, where stamps say so",
      ["2025-03-30T01:00+01:00", "2025-03-30T03:00+02:00"],
      {},
      "2025-03-30T01:00:00+01:00",
      3600,
    ],
    [
      "the hour put back, where stamps say so",
      ["2025-10-26T02:00+02:00", "2025-10-26T02:00+01:00"],
      {},
      "2025-10-26T02:00:00+02:00",
      3600,
    ],
    [
      "end stamps over a new year",
      ["2025-01-01T00:00+01:00", "2025-01-01T00:15+01:00"],
      { stamps: "end" },
      "2024-12-31T23:45:00+01:00",
      900,
    ],
    [
      "one end stamp with the step given",
      ["2025-01-01T00:00Z"],
      { stamps: "end", step: 86_400 },
      "2024-12-31T00:00:00+00:00",
      86_400,
    ],
  ] as const)("%s", async (_, stamps, options, start, step) => {
    expect(await read([...stamps], options)).toMatchObject({ start, step });
  });

  it("and fills rows that are missing inside, only when asked to", async () => {
    const stamps = ["2025-01-01T00:00Z", "2025-01-01T01:00Z", "2025-01-01T04:00Z"];
    const { irradiance, temperature } = await read(stamps, { fillMissingRows: true });
    expect(irradiance).toEqual({ kind: "plane-of-array", values: doubles(0, 1, Number.NaN, Number.NaN, 2) });
    expect(temperature).toEqual({ kind: "cell", values: doubles(5, 5, Number.NaN, Number.NaN, 5) });
    await expect(read(stamps)).rejects.toThrow("2 rows are missing");
  });

  it("and fills from the first row on when the step is given", async () => {
    const { irradiance } = await read(["2025-01-01T00:00Z", "2025-01-01T02:00Z"], {
      fillMissingRows: true,
      step: 3600,
    });
    expect(irradiance).toEqual({ kind: "plane-of-array", values: doubles(0, Number.NaN, 1) });
  });

  it("and fills an hour of a spring night when the clock is UTC", async () => {
    const stamps = ["2025-03-30T00:00", "2025-03-30T01:00", "2025-03-30T03:00"];
    const { irradiance } = await read(stamps, { fillMissingRows: true, utcOffset: "Z" });
    expect(irradiance).toEqual({ kind: "plane-of-array", values: doubles(0, 1, Number.NaN, 2) });
  });
});
