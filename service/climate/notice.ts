/** Something the caller should be told about a climate: a stable code, a sentence, and the figures behind it. */
export interface Notice {
  code: string;
  detail: string;
  values: Record<string, number>;
}
