import { boardOutline } from './boardOutline.js';
import { boardThreeLayers } from './boardThreeLayers.js';
import { giftBox } from './giftBox.js';
import { hatchedLeaf } from './hatchedLeaf.js';
import { islandContours } from './islandContours.js';
import { letterPage } from './letterPage.js';
import { motifSheet } from './motifSheet.js';
import { oneStrokeHouse } from './oneStrokeHouse.js';
import { posterWithMistakes } from './posterWithMistakes.js';
import { stippledMoon } from './stippledMoon.js';
import { windowLattice } from './windowLattice.js';

/** What draws each sample, by its file name. */
export const samples = {
  'board-outline.svg': boardOutline,
  'board-three-layers.svg': boardThreeLayers,
  'gift-box.svg': giftBox,
  'hatched-leaf.svg': hatchedLeaf,
  'island-contours.svg': islandContours,
  'letter-page.svg': letterPage,
  'motif-sheet.svg': motifSheet,
  'one-stroke-house.svg': oneStrokeHouse,
  'poster-with-mistakes.svg': posterWithMistakes,
  'stippled-moon.svg': stippledMoon,
  'window-lattice.svg': windowLattice,
};
