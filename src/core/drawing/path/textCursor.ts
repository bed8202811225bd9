const POWERS_OF_TEN = Array.from({ length: 23 }, (_, e) => Number(`1e${e}`));
/** Above this a further digit could pass 2^53 and lose exactness. */
const LARGEST_EXTENDABLE = 900719925474098;

/**
 * Steps through a value by the lexical rules of SVG 2 ("The grammar for path data"), which lists of
 * points and of transforms share: numbers are read greedily, so `-1.5.5-3` is -1.5, 0.5, -3.
 */
export class TextCursor {
  text = '';
  at = 0;
  /** The number read last; infinite where it was beyond the range of a double. */
  value = 0;

  reset(text: string): this {
    this.text = text;
    this.at = 0;
    return this;
  }

  atEnd(): boolean {
    return this.at >= this.text.length;
  }

  skipSpace(): void {
    while (isSpace(this.text.charCodeAt(this.at))) this.at++;
  }

  /** Skips `comma_wsp`; true where it held a comma. */
  skipCommaSpace(): boolean {
    this.skipSpace();
    if (this.text.charCodeAt(this.at) !== 44) return false;
    this.at++;
    this.skipSpace();
    return true;
  }

  /**
   * Reads a number into `value`, or returns false and stays. A trailing point (`23.`), legal in
   * SVG 1.1 only, is refused as browsers do. The result is the double nearest to the text.
   */
  number(): boolean {
    const { text, at: start } = this;
    let at = start;
    let c = text.charCodeAt(at);
    const negative = c === 45;
    if (negative || c === 43) c = text.charCodeAt(++at);
    let mantissa = 0;
    let exact = true;
    let digits = 0;
    let exponent = 0;
    for (; c >= 48 && c <= 57; c = text.charCodeAt(++at)) {
      digits++;
      if (mantissa <= LARGEST_EXTENDABLE) mantissa = mantissa * 10 + (c - 48);
      else exact = false;
    }
    if (c === 46) {
      c = text.charCodeAt(++at);
      if (!(c >= 48 && c <= 57)) return false;
      for (; c >= 48 && c <= 57; c = text.charCodeAt(++at)) {
        digits++;
        if (mantissa <= LARGEST_EXTENDABLE) {
          mantissa = mantissa * 10 + (c - 48);
          exponent--;
        } else exact = false;
      }
    }
    if (digits === 0) return false;
    if (c === 101 || c === 69) {
      let after = at + 1;
      let e = text.charCodeAt(after);
      const negativeExponent = e === 45;
      if (negativeExponent || e === 43) e = text.charCodeAt(++after);
      if (e >= 48 && e <= 57) {
        let power = 0;
        for (; e >= 48 && e <= 57; e = text.charCodeAt(++after))
          power = Math.min(power * 10 + (e - 48), 9999);
        exponent += negativeExponent ? -power : power;
        at = after;
      }
    }
    this.at = at;
    // One rounding of two exact numbers is the nearest double (Clinger 1990, the fast path).
    if (exact && exponent <= 0 && exponent >= -22) mantissa /= POWERS_OF_TEN[-exponent];
    else if (exact && exponent > 0 && exponent <= 22) mantissa *= POWERS_OF_TEN[exponent];
    else mantissa = Math.abs(Number(text.slice(start, at)));
    this.value = negative && mantissa !== 0 ? -mantissa : mantissa;
    return true;
  }

  /** Reads an arc flag, exactly one character `0` or `1`, into `value`. */
  flag(): boolean {
    const c = this.text.charCodeAt(this.at);
    if (c !== 48 && c !== 49) return false;
    this.value = c - 48;
    this.at++;
    return true;
  }
}

/** `wsp` of SVG 2: tab, line feed, form feed, carriage return, space. */
export function isSpace(c: number): boolean {
  return c === 32 || (c >= 9 && c <= 13 && c !== 11);
}
