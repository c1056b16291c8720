import { SILICON_BANDGAP, SILICON_BANDGAP_COEFFICIENT } from "../../../service/core/module/single-diode.ts";
import { fitModule } from "../../../service/studies/module-fit.ts";
import ratios from "../../fixtures/curve-ratios.json" with { type: "json" };
import { datasheetOf, plausibleModule } from "../../oracle/random-datasheets.ts";
import { seededRandom } from "../../oracle/seeded-random.ts";
import type { Finding } from "../check.ts";

/** Vmp/Voc and Imp/Isc of 200 random modules, solved by the service from their datasheets. */
function randomRatios(): Record<string, number>[] {
  const random = seededRandom(200);
  return Array.from({ length: 200 }, () => {
    const module = plausibleModule(random);
    const { standard } = fitModule({
      module: {
        kind: "datasheet",
        cellsInSeries: module.cellsInSeries,
        ...datasheetOf(module),
        bandgap: SILICON_BANDGAP,
        bandgapCoefficient: SILICON_BANDGAP_COEFFICIENT,
      },
    });
    return {
      "Vmp/Voc": standard.maximumPowerVoltage / standard.openCircuitVoltage,
      "Imp/Isc": standard.maximumPowerCurrent / standard.shortCircuitCurrent,
    };
  });
}

/** How often the trade's ratios hold over invented but plausible modules. */
export const CURVE_RATIOS: Finding = {
  title: "Curve ratios of 200 random plausible crystalline silicon datasheets",
  source: ratios.source,
  lines: () => {
    const found = randomRatios();
    return ratios.rows.map(({ ratio, from, to }) => {
      const values = found.map((one) => one[ratio]);
      const inside = values.filter((value) => value >= from && value <= to).length;
      const [least, most] = [Math.min(...values), Math.max(...values)].map((value) => value.toFixed(3));
      return `${ratio} lies in ${from.toFixed(2)} to ${to.toFixed(2)} in ${inside} of ${values.length}; it ranges from ${least} to ${most}.`;
    });
  },
};
