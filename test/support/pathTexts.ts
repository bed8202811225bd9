import fc from 'fast-check';

/** Halves, so that sums of relative steps have few digits: browsers tell positions to six. */
const number = fc.integer({ min: -60, max: 60 }).map((n) => n / 2);
const radius = fc.integer({ min: 0, max: 40 }).map((n) => n / 2);
const flag = fc.constantFrom('0', '1');

/** One number after another: with white space, commas, or nothing where the grammar allows it. */
const written = fc
  .tuple(number, fc.constantFrom(' ', ',', ' , ', '\n', ''), fc.nat(3))
  .map(([n, gap, form]) => {
    const plain = form === 1 ? `${n * 10}e-1` : form === 2 ? String(n).replace(/^(-?)0\./, '$1.') : String(n);
    return gap === '' ? (n < 0 ? plain : `+${plain}`) : gap + plain;
  });
const numbers = (count: number) =>
  fc.tuple(...Array.from({ length: count }, () => written)).map((n) => n.join(''));
const repeated = (part: fc.Arbitrary<string>) =>
  fc.array(part, { minLength: 1, maxLength: 3 }).map((n) => n.join(''));
const arc = fc
  .tuple(radius, radius, number, flag, flag, fc.constantFrom(' ', ',', ''), numbers(2))
  .map(([rx, ry, turn, large, sweep, gap, end]) => ` ${rx} ${ry} ${turn} ${large}${gap}${sweep}${end}`);

const ARGUMENTS: Readonly<Record<string, fc.Arbitrary<string>>> = {
  M: repeated(numbers(2)),
  L: repeated(numbers(2)),
  H: repeated(numbers(1)),
  V: repeated(numbers(1)),
  C: repeated(numbers(6)),
  S: repeated(numbers(4)),
  Q: repeated(numbers(4)),
  T: repeated(numbers(2)),
  A: repeated(arc),
  Z: fc.constantFrom('', ' '),
};

const command = fc
  .tuple(fc.constantFrom(...Object.keys(ARGUMENTS)), fc.boolean())
  .chain(([letter, small]) =>
    ARGUMENTS[letter].map((text) => (small ? letter.toLowerCase() : letter) + withoutComma(text)),
  );

/** No comma stands between a letter and its first number. */
function withoutComma(text: string): string {
  return text.replace(/^[\s,]*/, ' ');
}

/** Path data by the grammar of SVG 2, all commands alike. */
export const pathText: fc.Arbitrary<string> = fc
  .tuple(numbers(2), fc.array(command, { maxLength: 8 }))
  .map(([start, rest]) => `M${withoutComma(start)}${rest.join('')}`);

/** Forms on which browsers and the grammar of SVG 2 part, or numbers too large for a float. */
const DISPUTED: readonly RegExp[] = [
  /e(?!-1(?!\d))/, // what is left of `7e-`: a number 7 or none
];

/** The same with one character put in, taken out or changed. */
export const pathTextWithSlip: fc.Arbitrary<string> = fc
  .tuple(pathText, fc.nat(), fc.constantFrom(...'MLZzaehT,. -+05x#'), fc.nat(2))
  .map(([text, where, slip, kind]) => {
    const at = where % text.length;
    return text.slice(0, at) + (kind === 0 ? '' : slip) + text.slice(kind === 1 ? at : at + 1);
  })
  .filter((text) => !DISPUTED.some((form) => form.test(text)));
