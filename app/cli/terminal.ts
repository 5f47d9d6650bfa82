// Where a command speaks: results on standard output, everything else on standard error.

export interface Terminal {
  /** A line of the result. */
  print(text: string): void;
  /** A line beside the result. */
  note(text: string): void;
  /** How far a run is: one line that is written over, or every tenth as a line of its own. */
  progress(done: number, what: string): void;
  /** Takes the progress line away. */
  endProgress(): void;
}

export interface Stream {
  readonly isTTY?: boolean;
  write(text: string): unknown;
}

export function terminal(out: Stream, err: Stream, wantsProgress: boolean): Terminal {
  const overwrites = err.isTTY === true;
  const shows = overwrites || wantsProgress;
  let shownTenth = -1;
  let isLineOpen = false;

  function endProgress() {
    if (isLineOpen) err.write('\r\u001b[2K');
    isLineOpen = false;
    shownTenth = -1;
  }
  return {
    print: (text) => out.write(`${text}\n`),
    note(text) {
      endProgress();
      err.write(`${text}\n`);
    },
    progress(done, what) {
      if (!shows) return;
      const percent = Math.floor(done * 100);
      if (overwrites) {
        err.write(`\r\u001b[2K${String(percent).padStart(3)} %  ${what}`);
        isLineOpen = true;
      } else if (Math.floor(percent / 10) > shownTenth) {
        shownTenth = Math.floor(percent / 10);
        err.write(`${String(percent).padStart(3)} %  ${what}\n`);
      }
    },
    endProgress,
  };
}
