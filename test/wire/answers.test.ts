import { Ajv2020 } from "ajv/dist/2020.js";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
// The committed document, which another test holds against the one that is served.
import committed from "../../openapi/openapi.json" with { type: "json" };
import { CEILINGS } from "../../service/wire/limits.ts";
import { performOperation } from "../../service/wire/operations.ts";
import { bases, bend, changes } from "./random-requests.ts";
import { bodyOf } from "./requests.ts";

const ajv = new Ajv2020({ strict: false });
ajv.addSchema({ $id: "document", components: committed.components });

/** Less work than would keep a test waiting. */
const limits = { ...CEILINGS, controlPeriods: 5_000_000 };

describe("whatever is sent", () => {
  it.each(Object.values(bases))(
    "to $operation is answered in the form of the document or refused with a reason",
    (base) => {
      const { operation, answer, make } = base;
      const conforms = ajv.getSchema(`document#/components/schemas/${answer}`)!;
      let answers = 0;
      fc.assert(
        fc.property(fc.nat(), changes, (which, list) => {
          const options = make();
          const request = bend(options[which % options.length], list);
          const given = performOperation(operation, bodyOf(request), limits);
          if (given.ok) {
            answers++;
            const value = JSON.parse(new TextDecoder().decode(given.bytes));
            expect(conforms(value), `${JSON.stringify(request)} ${JSON.stringify(conforms.errors)}`).toBe(true);
            return;
          }
          expect(["invalid-request", "too-much-work"], `${JSON.stringify(request)} ${given.fault}`).toContain(
            given.problem.code,
          );
          for (const { pointer, detail } of given.problem.errors) {
            expect(pointer).toMatch(/^(\/|$)/);
            expect(detail).toMatch(/^.{15,400}[.?]\)?$/);
            expect(detail).not.toMatch(/undefined|NaN is|Infinity|\[object| a object/);
          }
        }),
        { numRuns: 250, seed: 7 },
      );
      expect(answers).toBeGreaterThan(30);
    },
  );
});
