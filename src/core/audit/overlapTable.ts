/**
 * Overlaps of drawn with wanted pieces as columns, since there may be millions. Row i says that the
 * drawn piece from fraction `from0` to `to0` runs beside the wanted one from `from1` to `to1` (from1 >
 * to1 where they are opposed), `offsetFrom` and `offsetTo` away at the two ends.
 */
export class OverlapTable {
  count = 0;
  drawnSpan = new Uint32Array(1024);
  drawnPiece = new Uint32Array(1024);
  wantedSpan = new Uint32Array(1024);
  wantedPiece = new Uint32Array(1024);
  from0 = new Float64Array(1024);
  to0 = new Float64Array(1024);
  from1 = new Float64Array(1024);
  to1 = new Float64Array(1024);
  offsetFrom = new Float64Array(1024);
  offsetTo = new Float64Array(1024);

  add(
    drawnSpan: number,
    drawnPiece: number,
    wantedSpan: number,
    wantedPiece: number,
    from0: number,
    to0: number,
    from1: number,
    to1: number,
    offsetFrom: number,
    offsetTo: number,
  ): number {
    const i = this.count++;
    if (i === this.from0.length) this.grow();
    this.drawnSpan[i] = drawnSpan;
    this.drawnPiece[i] = drawnPiece;
    this.wantedSpan[i] = wantedSpan;
    this.wantedPiece[i] = wantedPiece;
    this.from0[i] = from0;
    this.to0[i] = to0;
    this.from1[i] = from1;
    this.to1[i] = to1;
    this.offsetFrom[i] = offsetFrom;
    this.offsetTo[i] = offsetTo;
    return i;
  }

  /** Adds row i of another table. */
  addRow(other: OverlapTable, i: number): number {
    return this.add(
      other.drawnSpan[i],
      other.drawnPiece[i],
      other.wantedSpan[i],
      other.wantedPiece[i],
      other.from0[i],
      other.to0[i],
      other.from1[i],
      other.to1[i],
      other.offsetFrom[i],
      other.offsetTo[i],
    );
  }

  /** Cuts row i at a share of its length: the row keeps the first part, a new row gets the second. */
  cut(i: number, share: number): number {
    const at0 = this.from0[i] + share * (this.to0[i] - this.from0[i]);
    const at1 = this.from1[i] + share * (this.to1[i] - this.from1[i]);
    const offset = this.offsetFrom[i] + share * (this.offsetTo[i] - this.offsetFrom[i]);
    const rest = this.add(
      this.drawnSpan[i],
      this.drawnPiece[i],
      this.wantedSpan[i],
      this.wantedPiece[i],
      at0,
      this.to0[i],
      at1,
      this.to1[i],
      offset,
      this.offsetTo[i],
    );
    this.to0[i] = at0;
    this.to1[i] = at1;
    this.offsetTo[i] = offset;
    return rest;
  }

  private grow(): void {
    this.drawnSpan = doubled(this.drawnSpan, new Uint32Array(2 * this.drawnSpan.length));
    this.drawnPiece = doubled(this.drawnPiece, new Uint32Array(2 * this.drawnPiece.length));
    this.wantedSpan = doubled(this.wantedSpan, new Uint32Array(2 * this.wantedSpan.length));
    this.wantedPiece = doubled(this.wantedPiece, new Uint32Array(2 * this.wantedPiece.length));
    this.from0 = doubled(this.from0, new Float64Array(2 * this.from0.length));
    this.to0 = doubled(this.to0, new Float64Array(2 * this.to0.length));
    this.from1 = doubled(this.from1, new Float64Array(2 * this.from1.length));
    this.to1 = doubled(this.to1, new Float64Array(2 * this.to1.length));
    this.offsetFrom = doubled(this.offsetFrom, new Float64Array(2 * this.offsetFrom.length));
    this.offsetTo = doubled(this.offsetTo, new Float64Array(2 * this.offsetTo.length));
  }
}

function doubled<T extends Uint32Array | Float64Array>(from: T, to: T): T {
  to.set(from);
  return to;
}
