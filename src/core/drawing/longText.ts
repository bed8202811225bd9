/** Text made of many short pieces, joined now and then so that they do not pile up. */
export class LongText {
  private readonly chunks: string[] = [];
  private pieces: string[] = [];

  add(piece: string): void {
    if (this.pieces.push(piece) < 4096) return;
    this.chunks.push(this.pieces.join(''));
    this.pieces = [];
  }

  finish(): string {
    return this.chunks.join('') + this.pieces.join('');
  }
}
