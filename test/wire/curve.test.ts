import { describe, expect, it } from "vitest";
import fractions from "../fixtures/fractions-on-test-generator.json" with { type: "json" };
import measuredCurves from "../fixtures/measured-curves.json" with { type: "json" };
import type { Json } from "./requests.ts";
import { answered, curveRequest, GENERATOR } from "./requests.ts";

const curved = (request: Json) => answered("curve", request).answer;

describe("a curve", () => {
  const answer = curved({ ...curveRequest(), points: 101 });

  it("runs in equal steps from short circuit at 0 V to open circuit at 0 A", () => {
    const { voltage, current, power } = answer;
    expect([voltage.length, current.length, power.length]).toEqual([101, 101, 101]);
    expect([voltage[0], current[0], power[0]]).toEqual([0, answer.shortCircuitCurrent, 0]);
    expect([voltage[100], current[100], power[100]]).toEqual([answer.openCircuitVoltage, 0, 0]);
    for (let k = 1; k <= 100; k++) {
      expect(voltage[k] - voltage[k - 1]).toBeCloseTo(answer.openCircuitVoltage / 100, 9);
      expect(current[k]).toBeLessThan(current[k - 1]);
      expect(power[k]).toBe(voltage[k] * current[k]);
    }
  });

  it("has one peak in even light, above every point", () => {
    expect(answer.peaks).toHaveLength(1);
    const [{ voltage, current, power }] = answer.peaks;
    expect(power).toBeCloseTo(voltage * current, 9);
    expect(Math.max(...answer.power)).toBeLessThanOrEqual(power);
    expect(Math.max(...answer.power)).toBeGreaterThan(0.999 * power);
  });

  it("says where each rule sits, in V, A and W: what is lost adds up by cause to what is missing of the peak", () => {
    const kinds = answered("curve", {
      ...curveRequest(),
      rules: [
        { kind: "perfect" },
        { kind: "constant-voltage", setVoltagePerModule: 25 },
        { kind: "temperature-compensated-voltage" },
        { kind: "fractional-open-circuit-voltage" },
        { kind: "short-current-pulse" },
        { kind: "battery-coupled", batteryVoltage: 27 },
        { kind: "perturb-and-observe" },
        { kind: "incremental-conductance" },
        { kind: "power-curve-scan" },
      ],
    }).answer;
    const peak = kinds.peaks[0].power;
    for (const { rule, power, lost, lostByCause } of kinds.places) {
      const sum = Object.values<number>(lostByCause).reduce((all, one) => all + one, 0);
      expect(power + lost, rule.kind).toBeCloseTo(peak, 9);
      expect(sum, rule.kind).toBeCloseTo(lost, 9);
      expect(lost, rule.kind).toBeGreaterThan(-1e-9);
    }
    const [perfect, constant, , fractional, , battery, climber] = kinds.places;
    expect(perfect.lost).toBeCloseTo(0, 9);
    expect([constant.voltage, battery.voltage]).toEqual([25, 27]);
    expect(fractional.voltage).toBeCloseTo(0.76 * kinds.openCircuitVoltage, 9);
    // The defaults of the rule: .256 s each 16 s without power.
    expect(fractional.lostByCause.interruption).toBeCloseTo(
      (0.256 / 16) * 0.76 * kinds.openCircuitVoltage * currentAt(fractional),
      9,
    );
    expect(climber.lostByCause.regulation).toBeCloseTo(climber.lost, 12);
  });

  /** Current while the rule delivers, from its mean over interruptions of .256 s each 16 s. */
  function currentAt(place: Json): number {
    return place.current / (1 - 0.256 / 16);
  }

  it("holds the short-circuit current's fraction, read at the terminals", () => {
    const rule = { kind: "short-current-pulse", fraction: 0.9, sampleDuration: 0 };
    const { places, shortCircuitCurrent } = curved({ ...curveRequest(), rules: [rule] });
    expect(places[0].current).toBeCloseTo(0.9 * shortCircuitCurrent, 9);
  });

  it("scales with the array: voltages by modules in series, currents by strings", () => {
    const rules = [{ kind: "fractional-open-circuit-voltage" }];
    const one = curved({ ...curveRequest(), rules });
    const many = curved({ ...curveRequest(), rules, array: { modulesInSeries: 3, stringsInParallel: 2 } });
    expect(many.openCircuitVoltage / one.openCircuitVoltage).toBeCloseTo(3, 10);
    expect(many.shortCircuitCurrent / one.shortCircuitCurrent).toBeCloseTo(2, 10);
    expect(many.peaks[0].power / one.peaks[0].power).toBeCloseTo(6, 10);
    expect(many.places[0].lost / one.places[0].lost).toBeCloseTo(6, 8);
  });

  it("sees the converter's window and limits", () => {
    const at = (converter: Json) => curved({ ...curveRequest(), rules: [{ kind: "perfect" }], converter }).places[0];
    const peak = answer.peaks[0];
    const windowed = at({ trackingMinimumVoltage: peak.voltage + 3 });
    expect(windowed.voltage).toBeCloseTo(peak.voltage + 3, 9);
    expect(windowed.lostByCause.voltageWindow).toBeCloseTo(windowed.lost, 9);
    // Power above a limit is clipped, not lost.
    const limited = at({ maximumPower: peak.power / 2 });
    expect(limited.power).toBeCloseTo(peak.power / 2, 9);
    expect(limited.lost).toBeCloseTo(0, 9);
  });

  it("digests its request", () => {
    const digest = (request: Json) => curved(request).provenance.inputDigest;
    expect(digest(curveRequest())).toMatch(/^[0-9a-f]{64}$/);
    expect(digest({ ...curveRequest(), irradiance: 801 })).not.toBe(digest(curveRequest()));
  });
});

describe.each(measuredCurves.rows)("the curve of the published circuit of $name", (row) => {
  // The literature's constants of CODATA 1998. Sent as if at 25 degC, so that no translation comes between.
  const cells = row.published.idealityTimesCells ?? row.published.ideality! * row.cellsInSeries;
  const idealityVoltage = (cells * 1.3806503e-23 * (row.temperature + 273.15)) / 1.60217646e-19;
  const { photocurrent, saturationCurrent, seriesResistance, shuntResistance } = row.published;
  const module = { kind: "single-diode", cellsInSeries: row.cellsInSeries, idealityVoltage };
  const answer = curved({
    module: { ...module, photocurrent, saturationCurrent, seriesResistance, shuntResistance },
    irradiance: 1000,
    cellTemperature: 25,
  });

  it("peaks at the maximum power point computed independently to 15 digits, and ends at its other key points", () => {
    const { keyPoints } = row;
    expect(answer.peaks[0].power / keyPoints.maximumPower).toBeCloseTo(1, 12);
    expect(answer.peaks[0].voltage / keyPoints.maximumPowerVoltage).toBeCloseTo(1, 7);
    expect(answer.peaks[0].current / keyPoints.maximumPowerCurrent).toBeCloseTo(1, 7);
    expect(answer.shortCircuitCurrent / keyPoints.shortCircuitCurrent).toBeCloseTo(1, 12);
    expect(answer.openCircuitVoltage / keyPoints.openCircuitVoltage).toBeCloseTo(1, 12);
  });
});

describe("fraction rules on the standard's test generator", () => {
  it.each([100, 1000])("sit where the formulas say at %i W/m2, to the stated five digits", (irradiance) => {
    for (const technology of ["crystalline-silicon", "thin-film"]) {
      const rows = fractions.rows.filter((row) => row.technology === technology);
      expect(rows.length).toBeGreaterThan(8);
      const { peaks, places } = curved({
        module: { ...GENERATOR, technology },
        irradiance,
        cellTemperature: 25,
        rules: rows.map(({ rule, fraction }) => ({ kind: rule, fraction, sampleDuration: 0 })),
      });
      for (const [index, { efficiency }] of rows.entries()) {
        expect(Math.abs(places[index].power / peaks[0].power - efficiency)).toBeLessThan(1e-5);
      }
    }
  });
});
