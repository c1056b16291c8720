/** Lines on their way to a reader. */
export interface LineOutput {
  stream: ReadableStream<Uint8Array>;
  /** Hands a line over, whether or not the reader keeps up: ask `ready` before making more. */
  write(line: Uint8Array): void;
  /** Whether the reader is behind. */
  isFull(): boolean;
  /** Resolves once the reader is not behind, or will read no more. */
  ready(): Promise<void>;
  /** The reader is not waited for any longer. */
  waive(): void;
  /** Ends the answer after what was written. */
  close(): void;
}

/** What a reader does. */
export interface ReaderEvents {
  /** It has caught up after it was behind. */
  onCaughtUp: () => void;
  onLeft: () => void;
}

/** Lines written and not yet taken, bytes: beyond this the reader is behind. */
const ROOM = 64 * 1024;
const EMPTY_LINE = Uint8Array.of(0x0a);

/** A stream of lines; an empty one wherever `silence` ms pass without any, so that nobody takes the stream for dead. */
export function createLineOutput(silence: number, { onCaughtUp, onLeft }: ReaderEvents): LineOutput {
  let controller: ReadableStreamDefaultController<Uint8Array>;
  let isOpen = true;
  let isWaived = false;
  let wasFull = false;
  const waiting: (() => void)[] = [];
  const wake = () => {
    for (const resume of waiting.splice(0)) resume();
  };
  const isFull = () => isOpen && !isWaived && (controller.desiredSize ?? 0) <= 0;
  const end = () => {
    isOpen = false;
    clearInterval(pulse);
    wake();
  };
  const stream = new ReadableStream<Uint8Array>(
    {
      start: (given) => {
        controller = given;
      },
      pull: () => {
        if (!wasFull) return;
        wasFull = false;
        onCaughtUp();
        wake();
      },
      cancel: () => {
        end();
        onLeft();
      },
    },
    new ByteLengthQueuingStrategy({ highWaterMark: ROOM }),
  );
  const put = (line: Uint8Array) => {
    if (!isOpen) return;
    controller.enqueue(line);
    wasFull ||= isFull();
  };
  // A reader who is behind is not helped by more to read.
  const pulse = setInterval(() => !isFull() && put(EMPTY_LINE.slice()), silence);
  return {
    stream,
    write: (line) => {
      put(line);
      pulse.refresh();
    },
    isFull,
    ready: async () => {
      while (isFull()) await new Promise<void>((resume) => waiting.push(resume));
    },
    waive: () => {
      isWaived = true;
      wake();
    },
    close: () => {
      if (isOpen) controller.close();
      end();
    },
  };
}
