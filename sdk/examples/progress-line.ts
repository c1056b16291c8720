/** Where progress is shown. */
export interface Screen {
  readonly isTTY?: boolean;
  write(text: string): unknown;
}

const WIDTH = 30;

/** Shows progress: on a terminal a bar that is drawn over, elsewhere a line for every tenth of the whole. */
export function progressLine(screen: Screen): (done: number, total: number) => void {
  let tenths = 0;
  return (done, total) => {
    if (screen.isTTY) {
      const full = Math.floor((WIDTH * done) / total);
      screen.write(`\r\x1b[2K${"█".repeat(full)}${"░".repeat(WIDTH - full)} ${done} of ${total}`);
      if (done === total) screen.write("\n");
      return;
    }
    const now = Math.floor((10 * done) / total);
    if (now > tenths) screen.write(`${done} of ${total}\n`);
    tenths = Math.max(tenths, now);
  };
}
