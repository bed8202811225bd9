const ARITY: Readonly<Record<string, number>> = {
  M: 2,
  L: 2,
  H: 1,
  V: 1,
  C: 6,
  S: 4,
  Q: 4,
  T: 2,
  A: 7,
  Z: 0,
};
const LETTERS = Object.keys(ARITY);
const SPACES = [' ', ',', ' , ', '\n', '\t', ',\r\n', '  '];
const SLIPS = ['', 'e', '.', '-', ',', 'x', 'Z', '1', 'M', ' ', 'a', '+', '\f', '1e999', 'NaN', '#', ',,'];

/** Path data made from the grammar of SVG 2, in all its spellings; with one slip on request. */
export function randomPath(random: () => number, withSlip: boolean): string {
  const below = (n: number): number => Math.floor(random() * n);
  const of = (list: readonly string[]): string => list[below(list.length)];
  const digits = (n: number): string => String(below(10 ** n));
  const plain = (): string => {
    const form = below(5);
    if (form === 0) return digits(4);
    if (form === 1) return `.${digits(3)}`;
    if (form === 2) return `${digits(2)}.${digits(8)}`;
    if (form === 3) return `${digits(3)}e${of(['', '-', '+'])}${digits(1)}`;
    return `${digits(1)}.${digits(2)}E-${digits(2)}`;
  };
  /** A number and what parts it from the one before: nothing where a sign does. */
  const next = (): string => {
    const sign = of(['', '', '-', '+']);
    return (sign === '' || below(3) === 0 ? of(SPACES) : '') + sign + plain();
  };
  const set = (letter: string): string => {
    if (letter !== 'A') return Array.from({ length: ARITY[letter] }, next).join('');
    const flags = of(['0', '1']) + of(['', ' ', ',']) + of(['0', '1']);
    return `${of(SPACES)}${plain()}${of(SPACES)}${plain()}${next()}${of(SPACES)}${flags}${next()}${next()}`;
  };
  let data = `${of(['', ' ', '\n'])}M${set('M').replace(/^[\s,]+/, of(['', ' ']))}`;
  for (let left = below(8); left > 0; left--) {
    const letter = of(LETTERS);
    let sets = '';
    for (let k = ARITY[letter] === 0 ? 0 : 1 + below(3); k > 0; k--) sets += set(letter);
    sets = sets.replace(/^[\s,]+/, of(['', ' ', '\n']));
    data += of(['', ' ', '\n']) + (below(2) === 0 ? letter : letter.toLowerCase()) + sets;
  }
  if (!withSlip) return data;
  const at = below(data.length);
  return data.slice(0, at) + of(SLIPS) + data.slice(at + below(3));
}
