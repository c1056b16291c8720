import { describe, expect, it } from "vitest";
import { retryAfter } from "../../sdk/src/retry-after.ts";

// RFC 9110, section 5.6.7: the three forms of one instant; 784111777 s after 1970 by Python's datetime.
const INSTANT = 784_111_777_000;
const FORMS = ["Sun, 06 Nov 1994 08:49:37 GMT", "Sunday, 06-Nov-94 08:49:37 GMT", "Sun Nov  6 08:49:37 1994"];

describe("retryAfter", () => {
  it("reads whole seconds (RFC 9110, section 10.2.3: 120 is two minutes)", () => {
    expect(retryAfter("120", undefined, 0)).toBe(120_000);
    expect(retryAfter(" 0 ", undefined, 0)).toBe(0);
  });

  it.each(FORMS)("reads the date %s", (form) => {
    expect(retryAfter(form, undefined, INSTANT - 1500)).toBe(1500);
  });

  it("measures a date from the answer's own Date, whatever the client's clock says", () => {
    expect(retryAfter(FORMS[0], "Sun, 06 Nov 1994 08:49:07 GMT", 0)).toBe(30_000);
  });

  it("is 0 for a date gone by", () => {
    expect(retryAfter(FORMS[0], undefined, INSTANT + 60_000)).toBe(0);
  });

  it.each(["-1", "1.5", "soon", "", "99999999999", "Sun, 99 Nov 1994 08:49:37 GMT"])("is null for %j", (field) => {
    expect(retryAfter(field, undefined, 0)).toBeNull();
  });

  it("is null without the field", () => {
    expect(retryAfter(undefined, undefined, 0)).toBeNull();
  });
});
