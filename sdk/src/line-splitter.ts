/** Cuts the bytes of an answer into lines; holds no more than the line that is not complete. */
export class LineSplitter {
  readonly #decoder = new TextDecoder("utf-8", { fatal: true });
  #rest = "";

  /** The lines that `chunk` completes, without those that are blank. Throws TypeError for bytes that are not UTF-8. */
  write(chunk: Uint8Array): string[] {
    const text = this.#decoder.decode(chunk, { stream: true });
    if (!text.includes("\n")) {
      this.#rest += text;
      return [];
    }
    const lines = (this.#rest + text).split("\n");
    this.#rest = lines.pop()!;
    return lines.filter((line) => line.trim() !== "");
  }

  /** What stands behind the last line break: empty after a whole answer. A character that was cut is left out. */
  end(): string {
    return this.#rest.trim();
  }
}
