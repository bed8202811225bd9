/** Turns offsets into lines and columns, both from 1; a column counts UTF-16 units. */
export class LineIndex {
  private starts: number[] | null = null;

  constructor(private readonly text: string) {}

  /** O(log lines) after the first call, which is O(text). */
  locate(offset: number): { line: number; column: number } {
    this.starts ??= lineStarts(this.text);
    let low = 0;
    let high = this.starts.length;
    while (high - low > 1) {
      const middle = (low + high) >> 1;
      if (this.starts[middle] <= offset) low = middle;
      else high = middle;
    }
    return { line: low + 1, column: offset - this.starts[low] + 1 };
  }
}

/** Line ends as XML 1.0 §2.11 has them: LF, CR LF, or CR alone. */
function lineStarts(text: string): number[] {
  const starts = [0];
  const hasCarriageReturn = text.indexOf('\r') >= 0;
  if (!hasCarriageReturn) {
    for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) starts.push(at + 1);
    return starts;
  }
  for (let at = 0; at < text.length; at++) {
    const c = text.charCodeAt(at);
    if (c === 10 || (c === 13 && text.charCodeAt(at + 1) !== 10)) starts.push(at + 1);
  }
  return starts;
}
