/** On every answer: nothing is stored, framed, sniffed or lent to other origins. CORS stays off: no header allows any. */
export const SECURITY_HEADERS = [
  ["cache-control", "no-store"],
  ["content-security-policy", "default-src 'none'; frame-ancestors 'none'"],
  ["cross-origin-resource-policy", "same-origin"],
  ["referrer-policy", "no-referrer"],
  ["x-content-type-options", "nosniff"],
] as const;
