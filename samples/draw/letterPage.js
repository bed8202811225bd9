import { letters, textWidth } from './singleLineLetters.js';
import { svg } from './svg.js';

/** A recipe of our own. */
const TITLE = 'Pear and hazelnut loaf';
const OPENING =
  'For one tin of twelve slices. Half an hour of work, an hour in the oven, and a night of rest if you can bear to wait. Any pear will do that is ripe and still firm; a soft one is better eaten out of hand by whoever has to stir.';
const INGREDIENTS = [
  '- 250 g spelt flour, and a spoon for the tin',
  '- 100 g rolled oats',
  '- 3 ripe pears, firm enough to grate',
  '- 120 g hazelnuts, toasted and cut',
  '- 140 g soft butter, 110 g brown sugar',
  '- 3 eggs and 2 spoons of dark honey',
  '- 1 spoon of baking powder, 1/2 of salt',
  '- a little ginger, the peel of a lemon',
];
const STEPS = [
  "1. Heat the oven to 175 degrees. Butter the tin and dust it with flour; knock out what doesn't stick. Spread the oats on a tray and let them turn golden while the oven warms up, then leave them to cool by the window.",
  '2. Beat the butter with the sugar and the honey until it is pale and light. Add the eggs one after the other, and give each of them a full minute. If it looks as though it were about to curdle, stir in a spoon of the flour and carry on as if nothing had happened.',
  '3. Mix the flour, the baking powder, the salt and the spices. Grate the pears on the coarse side, skin and all, down to the core. Squeeze them gently over a cup and keep the juice for the glaze.',
  '4. Fold the flour into the butter in three parts, then the pears, the oats and most of the hazelnuts. Stop as soon as no dry flour can be seen: a quick hand makes a soft crumb, and a long one makes a brick.',
  '5. Fill the tin, smooth the top with a wet spoon and scatter the last hazelnuts over it. Bake for 55 minutes on the lower shelf. Lay a sheet of paper over it when the nuts grow dark.',
  '6. Try it with a thin stick: when it comes out clean, switch off the oven, open the door by a hand and let the loaf sit for ten minutes more. Run a knife along the walls of the tin and turn it out onto a rack.',
  '7. Boil the juice of the pears with one spoon of honey until it coats the back of a spoon. Brush it over the warm loaf, twice. It will shine like a varnished fiddle.',
];
const CLOSING = [
  'Keep it in a tin with a slice of apple. On the second day it is better, on the third day it is best, and a fourth day it has never seen. It freezes well; cut it first, so that you can take a slice at a time.',
  'For a picnic bake it in paper cups, 25 minutes each batch. Jam is not needed, quince jelly is welcome, and a piece of old cheese does no harm. Should a slice be left over and hard, toast it in a pan with butter, and give it to the one who washed up. Very young guests may prefer it with the nuts ground.',
  'Written down after the third try. The first was too wet, for the pears had not been squeezed; the second stood in the oven while somebody told a story, and went to the hens, who praised it warmly.',
];

const SCALE = 0.1;
const [LEFT, SECOND_COLUMN, RIGHT, PITCH] = [18, 106, 192, 5.9];

/** Breaks a paragraph into lines that fit between the margins. */
function broken(text) {
  const lines = [];
  for (const word of text.split(' ')) {
    const longer = lines.length > 0 ? `${lines[lines.length - 1]} ${word}` : word;
    if (lines.length > 0 && SCALE * textWidth(longer) <= RIGHT - LEFT) lines[lines.length - 1] = longer;
    else lines.push(word);
  }
  return lines;
}

/** A page of single-line lettering in reading order: many short strokes that meet only within a letter. */
export function letterPage() {
  const body = ['<g id="lettering">', '<g>', ...letters(TITLE, LEFT, 27, 2 * SCALE), '</g>'];
  let y = 40;
  const paragraph = (text) => {
    for (const row of broken(text)) {
      body.push('<g>', ...letters(row, LEFT, y, SCALE), '</g>');
      y += PITCH;
    }
    y += 2.5;
  };
  paragraph(OPENING);
  const half = INGREDIENTS.length / 2;
  INGREDIENTS.forEach((text, i) => {
    const left = i < half ? LEFT : SECOND_COLUMN;
    body.push('<g>', ...letters(text, left, y + (i % half) * PITCH, SCALE), '</g>');
  });
  y += half * PITCH + 2.5;
  [...STEPS, ...CLOSING].forEach(paragraph);
  body.push('</g>');
  return svg(210, 297, 'A recipe in single-line lettering', body, { stroke: '#1b2a6b', strokeWidth: 0.35 });
}
