import { Column } from '../column.js';

/** Turns offsets into lines and columns, both from 1; a column counts UTF-16 units. */
export class LineIndex {
  private starts: Column | null = null;
  /** The line found last: most questions are about it or the next. */
  private last = 0;

  constructor(private readonly text: string) {}

  /** O(log lines) after the first call, which is O(text). */
  locate(offset: number): { line: number; column: number } {
    this.starts ??= lineStarts(this.text);
    const { values, length } = this.starts;
    let low = this.last;
    let high = low + 2;
    if (offset < values[low]) {
      high = low;
      low = 0;
    } else if (high < length && values[high] <= offset) high = length;
    high = Math.min(high, length);
    while (high - low > 1) {
      const middle = (low + high) >> 1;
      if (values[middle] <= offset) low = middle;
      else high = middle;
    }
    this.last = low;
    return { line: low + 1, column: offset - values[low] + 1 };
  }
}

/** Line ends as XML 1.0 §2.11 has them: LF, CR LF, or CR alone. */
function lineStarts(text: string): Column {
  const starts = new Column();
  starts.push(0);
  if (text.indexOf('\r') < 0) {
    for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) starts.push(at + 1);
    return starts;
  }
  for (let at = 0; at < text.length; at++) {
    const c = text.charCodeAt(at);
    if (c === 10 || (c === 13 && text.charCodeAt(at + 1) !== 10)) starts.push(at + 1);
  }
  return starts;
}
