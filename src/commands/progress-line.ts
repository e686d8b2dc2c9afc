/** How far long work has come: one line on a terminal, written over and over. */
export interface ProgressLine {
  /** Takes the place of what was shown before. */
  show(text: string): void;
  /** Takes the line away, before anything else is written. */
  clear(): void;
}

/** Work that is done sooner shows nothing. */
const quietMilliseconds = 1000;
const betweenMilliseconds = 100;
/** So that the line never wraps, which could not be taken back. */
const mostCharacters = 78;

/** `now` in milliseconds since any moment, at first that at which the work begins. */
export function progressLine(write: (text: string) => void, now: () => number): ProgressLine {
  let next = now() + quietMilliseconds;
  let shown = false;
  return {
    show(text) {
      if (now() < next) return;
      next = now() + betweenMilliseconds;
      shown = true;
      write(`\r\u001b[K${text.slice(0, mostCharacters)}`);
    },
    clear() {
      if (shown) write('\r\u001b[K');
      shown = false;
    },
  };
}
