// Bytes of a text file → text, chunk by chunk: UTF-8, UTF-16 with or without its mark, and bytes that
// are neither as Windows-1252 letters (old tables with accents in a station's name).

export interface Decoder {
  /** Text of these bytes; an unfinished letter waits for the next chunk. */
  decode(bytes: Uint8Array): string;
  /** Text of what is left. */
  end(): string;
  /** What was found: shown in a note where it is not plain UTF-8. */
  readonly encoding: 'UTF-8' | 'UTF-16' | 'Windows-1252';
}

export function createDecoder(): Decoder {
  let rest: Uint8Array = new Uint8Array(0);
  let wide: 'little' | 'big' | null | undefined; // undefined: not looked yet
  let isOld = false;

  function decode(bytes: Uint8Array, isLast: boolean): string {
    let all = bytes;
    if (rest.length > 0) {
      all = new Uint8Array(rest.length + bytes.length);
      all.set(rest);
      all.set(bytes, rest.length);
    }
    if (wide === undefined && (all.length >= 4 || isLast)) wide = widthOf(all);
    if (wide === undefined) {
      rest = all;
      return '';
    }
    const used = wide === null ? wholeLetters(all, isLast) : all.length - (all.length % 2);
    rest = all.slice(used);
    const part = all.subarray(0, used);
    return wide === null ? narrow(part) : wideText(part, wide === 'big');
  }

  function narrow(bytes: Uint8Array): string {
    const out: string[] = [];
    let start = 0;
    const run = (to: number) => {
      for (let k = start; k < to; k += 8192)
        out.push(lettersOf(bytes.subarray(k, Math.min(to, k + 8192))));
    };
    for (let i = 0; i < bytes.length; ) {
      if (bytes[i] < 0x80) {
        i++;
        continue;
      }
      run(i);
      const letter = utf8Letter(bytes, i);
      if (letter === null) {
        isOld = true;
        out.push(String.fromCharCode(oldLetter(bytes[i])));
        i++;
      } else {
        out.push(String.fromCodePoint(letter.code));
        i += letter.length;
      }
      start = i;
    }
    run(bytes.length);
    return out.join('');
  }

  return {
    decode: (bytes) => decode(bytes, false),
    end: () => decode(new Uint8Array(0), true),
    get encoding() {
      if (wide) return 'UTF-16';
      return isOld ? 'Windows-1252' : 'UTF-8';
    },
  };
}

/** `apply` takes any list of numbers; spreading a typed array would go through its iterator. */
function lettersOf(bytes: Uint8Array): string {
  return String.fromCharCode.apply(null, bytes as unknown as number[]);
}

/** UTF-16 by its mark, or by every second byte being zero, as in numbers and Latin letters. */
function widthOf(bytes: Uint8Array): 'little' | 'big' | null {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'little';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'big';
  const n = Math.min(bytes.length - (bytes.length % 2), 1000);
  let even = 0;
  let odd = 0;
  for (let i = 0; i < n; i += 2) {
    if (bytes[i] === 0) even++;
    if (bytes[i + 1] === 0) odd++;
  }
  if (n >= 4 && odd > n * 0.35 && even === 0) return 'little';
  if (n >= 4 && even > n * 0.35 && odd === 0) return 'big';
  return null;
}

function wideText(bytes: Uint8Array, isBig: boolean): string {
  const out: string[] = [];
  for (let i = 0; i < bytes.length; i += 8192) {
    const part: number[] = [];
    for (let k = i; k < Math.min(bytes.length, i + 8192); k += 2)
      part.push(isBig ? bytes[k] * 256 + bytes[k + 1] : bytes[k + 1] * 256 + bytes[k]);
    out.push(String.fromCharCode(...part));
  }
  return out.join('');
}

/** Where the last unfinished UTF-8 letter begins, at most three bytes from the end. */
function wholeLetters(bytes: Uint8Array, isLast: boolean): number {
  if (isLast) return bytes.length;
  for (let back = 1; back <= Math.min(3, bytes.length); back++) {
    const byte = bytes[bytes.length - back];
    if (byte < 0x80) return bytes.length;
    if (byte >= 0xc0) return letterLength(byte) > back ? bytes.length - back : bytes.length;
  }
  return bytes.length;
}

function letterLength(lead: number): number {
  return lead >= 0xf0 ? 4 : lead >= 0xe0 ? 3 : 2;
}

function utf8Letter(bytes: Uint8Array, at: number): { code: number; length: number } | null {
  const lead = bytes[at];
  if (lead < 0xc2 || lead > 0xf4) return null;
  const length = letterLength(lead);
  if (at + length > bytes.length) return null;
  let code = lead & (0xff >> (length + 1));
  for (let k = 1; k < length; k++) {
    const byte = bytes[at + k];
    if ((byte & 0xc0) !== 0x80) return null;
    code = code * 64 + (byte & 0x3f);
  }
  const least = [0, 0, 0x80, 0x800, 0x10000][length];
  if (code < least || code > 0x10ffff || (code >= 0xd800 && code <= 0xdfff)) return null;
  return { code, length };
}

/** Windows-1252 is Latin-1 but for 0x80 to 0x9f, of which only the dash and quotes occur in tables. */
function oldLetter(byte: number): number {
  if (byte === 0x96 || byte === 0x97) return 0x2013;
  if (byte === 0x91 || byte === 0x92) return 0x2019;
  return byte;
}
