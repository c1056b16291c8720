const HTTP_DATE = /^(Mon|Tue|Wed|Thu|Fri|Sat|Sun)[a-z]*,? /;

/**
 * The wait a Retry-After field asks for, ms (RFC 9110, section 10.2.3): whole seconds, or a date in any of the three
 * forms of section 5.6.7. A date is measured from the answer's own Date field when it has one, so that a client clock
 * gone wrong does not matter, else from `now` (ms since 1970). A date gone by is 0; null for no field or an unreadable one.
 */
export function retryAfter(field: string | undefined, dateField: string | undefined, now: number): number | null {
  if (field === undefined) return null;
  const text = field.trim();
  if (/^\d{1,9}$/.test(text)) return Number(text) * 1000;
  const until = httpDate(text);
  return until === null ? null : Math.max(0, until - (httpDate(dateField?.trim() ?? "") ?? now));
}

function httpDate(text: string): number | null {
  if (!HTTP_DATE.test(text)) return null;
  // The asctime form names no zone; section 5.6.7 says it is UTC, Date.parse would take it as local time.
  const time = Date.parse(text.endsWith("GMT") ? text : `${text} GMT`);
  return Number.isNaN(time) ? null : time;
}
