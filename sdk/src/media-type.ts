/** Whether a media type is JSON: application/json or a type with the +json suffix (RFC 6839). */
export function isJson(mediaType: string): boolean {
  return mediaType === "application/json" || mediaType.endsWith("+json");
}

/** Whether a media type is read as a string: text, XML (RFC 7303) and lines of JSON. */
export function isText(mediaType: string): boolean {
  return mediaType.startsWith("text/") || mediaType.endsWith("+xml") || mediaType === "application/x-ndjson";
}
