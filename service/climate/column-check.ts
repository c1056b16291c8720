import { closure, type ThreeColumns } from "./closure.ts";
import { extraterrestrialNormal } from "./extraterrestrial-irradiance.ts";
import type { Notice } from "./notice.ts";
import type { WeatherRecord } from "./weather-record.ts";

const NAMES = ["global", "directNormal", "diffuse"] as const;

/** More than this share of samples has to be wrong before anything is said, and at most a fifth of it afterwards. */
const MANY = 0.1;
/** Two columns that are possible the other way round are named from this share on: seldom does weather show its limits. */
const SOME = 0.01;

/** Orders in which the given columns may have been meant: single exchanges first, they are likelier than a cycle. */
const ORDERS: readonly (readonly [number, number, number])[] = [
  [0, 2, 1],
  [1, 0, 2],
  [2, 1, 0],
  [1, 2, 0],
  [2, 0, 1],
];

type MaybeColumns = readonly [Float64Array | undefined, Float64Array | undefined, Float64Array | undefined];

function swapped(order: readonly number[], before: number, after: number): Notice {
  const moved = NAMES.map((name, k) => (order[k] === k ? "" : `${NAMES[order[k]]} holds ${name}`)).filter(Boolean);
  return {
    code: "columns-swapped",
    detail: `${(100 * before).toFixed(1)} % of the samples are impossible as given and ${(100 * after).toFixed(1)} % if ${moved.join(" and ")}: most likely the columns are swapped.`,
    values: { impossibleShare: before, impossibleShareSwapped: after },
  };
}

/**
 * Share of samples (sun 5 degrees up or more) that break a limit of what can be: global 1.5 I0 cos z + 100, diffuse
 * 0.95 I0 cos z + 50, direct I0, neither direct cos z nor diffuse above global by more than 5 % and 25 W/m2.
 *
 * Limits of Long & Dutton, BSRN Global Network recommended QC tests V2.0 (2002), with cos z for cos^1.2 z (wider; from
 * memory); the last two are the closure relation's.
 */
export function impossibleShare(record: WeatherRecord, columns: MaybeColumns): number {
  const [global, direct, diffuse] = columns;
  const { up, distance } = record.sun;
  let samples = 0;
  let impossible = 0;
  for (let i = 0; i < up.length; i++) {
    if (up[i] < 0.0872) continue;
    const outside = extraterrestrialNormal(distance[i]);
    const carried = direct ? direct[i] * up[i] : 0;
    const scattered = diffuse ? diffuse[i] : 0;
    const all = global ? global[i] : carried + scattered;
    samples++;
    if (
      all > 1.5 * outside * up[i] + 100 ||
      scattered > 0.95 * outside * up[i] + 50 ||
      (direct !== undefined && direct[i] > outside) ||
      Math.max(carried, scattered) > 1.05 * all + 25
    )
      impossible++;
  }
  return samples === 0 ? 0 : impossible / samples;
}

/** Of three columns: those that close in another order, a direct column already on the horizontal, or no reason known. */
function threeColumnNotices(record: WeatherRecord, columns: ThreeColumns): Notice[] {
  const given = closure(record, columns);
  if (given.open <= MANY) return [];
  let best: readonly number[] | null = null;
  let least = given.open / 5;
  for (const order of ORDERS) {
    const { open, samples } = closure(record, [columns[order[0]], columns[order[1]], columns[order[2]]]);
    if (samples === 0 || open >= (best === null ? least : least / 2)) continue;
    best = order;
    least = open;
  }
  if (best !== null) return [swapped(best, given.open, least)];
  const values = { openShare: given.open, bias: given.bias };
  const open = `${Math.round(100 * given.open)} % of the samples do not satisfy global = direct cos z + diffuse (mean difference ${Math.round(given.bias)} W/m2)`;
  if (closure(record, columns, true).open < given.open / 5)
    return [
      {
        code: "direct-on-horizontal",
        detail: `${open}, but global = direct + diffuse: most likely the direct column is on the horizontal and not facing the sun.`,
        values,
      },
    ];
  const detail = `${open}: most likely a wrong column, unit, site or time.`;
  return [{ code: "closure-violated", detail, values }];
}

/** Of two columns: those that are possible only the other way round. */
function twoColumnNotices(record: WeatherRecord, columns: MaybeColumns): Notice[] {
  const given = impossibleShare(record, columns);
  if (given <= SOME) return [];
  const [a, b] = [0, 1, 2].filter((k) => columns[k] !== undefined);
  const order = [0, 1, 2].map((k) => (k === a ? b : k === b ? a : k));
  const after = impossibleShare(record, [columns[order[0]], columns[order[1]], columns[order[2]]]);
  if (after < given / 5) return [swapped(order, given, after)];
  if (given <= MANY) return [];
  const detail = `${Math.round(100 * given)} % of the samples are brighter than the sky can be, or direct and diffuse exceed global: most likely a wrong column, unit, site or time.`;
  return [{ code: "irradiance-impossible", detail, values: { impossibleShare: given } }];
}

/**
 * Looks for swapped, wrong or horizontal columns: three by closure (Long & Shi 2008), two by what is possible (Long &
 * Dutton 2002). A single global column has nothing to be held against: no notice.
 */
export function columnNotices(record: WeatherRecord): Notice[] {
  const { global, directNormal, diffuse } = record.given;
  if (global && directNormal && diffuse) return threeColumnNotices(record, [global, directNormal, diffuse]);
  const two = [global, directNormal, diffuse] as const;
  return two.filter(Boolean).length === 2 ? twoColumnNotices(record, two) : [];
}
