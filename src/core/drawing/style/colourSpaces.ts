import { sinCosDegrees } from '../../geometry/trig.js';
import {
  cubeRoot,
  power563Over256,
  powerFiveTwelfths,
  powerNineFifths,
  powerTwelveFifths,
  powerTwentyNinths,
} from './fractionalPowers.js';

/** Three components of one colour. */
export type Triple = readonly [number, number, number];

type Matrix = readonly [Triple, Triple, Triple];

/*
 * The matrices of CSS Color Module Level 4, §19, "Sample code for color conversions", worked out to the
 * digits of a double. XYZ is that of D65 unless said.
 */
const XYZ_TO_SRGB: Matrix = [
  [12831 / 3959, -329 / 214, -1974 / 3959],
  [-851781 / 878810, 1648619 / 878810, 36519 / 878810],
  [705 / 12673, -2585 / 12673, 705 / 667],
];
const SRGB_TO_XYZ: Matrix = [
  [506752 / 1228815, 87881 / 245763, 12673 / 70218],
  [87098 / 409605, 175762 / 245763, 12673 / 175545],
  [7918 / 409605, 87881 / 737289, 1001167 / 1053270],
];
const P3_TO_XYZ: Matrix = [
  [608311 / 1250200, 189793 / 714400, 198249 / 1000160],
  [35783 / 156275, 247089 / 357200, 198249 / 2500400],
  [0, 32229 / 714400, 5220557 / 5000800],
];
const A98_TO_XYZ: Matrix = [
  [573536 / 994567, 263643 / 1420810, 187206 / 994567],
  [591459 / 1989134, 6239551 / 9945670, 374412 / 4972835],
  [53769 / 1989134, 351524 / 4972835, 4929758 / 4972835],
];
const REC2020_TO_XYZ: Matrix = [
  [63426534 / 99577255, 20160776 / 139408157, 47086771 / 278816314],
  [26158966 / 99577255, 472592308 / 697040785, 8267143 / 139408157],
  [0, 19567812 / 697040785, 295819943 / 278816314],
];
const PROPHOTO_TO_XYZ_D50: Matrix = [
  [0.7977666449006423, 0.13518129740053308, 0.0313477341283922],
  [0.2880748288194013, 0.711835234241873, 0.00008993693872564],
  [0, 0, 0.8251046025104602],
];
const D50_TO_D65: Matrix = [
  [0.955473421488075, -0.02309845494876471, 0.06325924320057072],
  [-0.0283697093338637, 1.0099953980813041, 0.021041441191917323],
  [0.012314014864481998, -0.020507649298898964, 1.330365926242124],
];
const LMS_TO_XYZ: Matrix = [
  [1.2268798758459243, -0.5578149944602171, 0.2813910456659647],
  [-0.0405757452148008, 1.112286803280317, -0.0717110580655164],
  [-0.0763729366746601, -0.4214933324022432, 1.5869240198367816],
];
const OKLAB_TO_LMS: Matrix = [
  [1, 0.3963377773761749, 0.2158037573099136],
  [1, -0.1055613458156586, -0.0638541728258133],
  [1, -0.0894841775298119, -1.2914855480194092],
];
const XYZ_TO_LMS: Matrix = [
  [0.819022437996703, 0.3619062600528904, -0.1288737815209879],
  [0.0329836539323885, 0.9292868615863434, 0.0361446663506424],
  [0.0481771893596242, 0.2642395317527308, 0.6335478284694309],
];
const LMS_TO_OKLAB: Matrix = [
  [0.210454268309314, 0.7936177747023054, -0.0040720430116193],
  [1.9779985324311684, -2.4285922420485799, 0.450593709617411],
  [0.0259040424655478, 0.7827717124575296, -0.8086757549230774],
];
const REC2020_ALPHA = 1.09929682680944;
const REC2020_BETA = 0.018053968510807;
/** Of D50: x, y = 0.3457, 0.3585. */
const WHITE_D50: Triple = [0.3457 / 0.3585, 1, (1 - 0.3457 - 0.3585) / 0.3585];

function apply(m: Matrix, v: Triple): Triple {
  const row = (r: Triple): number => r[0] * v[0] + r[1] * v[1] + r[2] * v[2];
  return [row(m[0]), row(m[1]), row(m[2])];
}

function each(v: Triple, f: (c: number) => number): Triple {
  return [f(v[0]), f(v[1]), f(v[2])];
}

/** A transfer function of positive numbers, continued to negative ones as CSS does. */
function signed(f: (c: number) => number): (c: number) => number {
  return (c) => (c < 0 ? -f(-c) : f(c));
}

const srgbToLinear = signed((c) => (c <= 0.04045 ? c / 12.92 : powerTwelveFifths((c + 0.055) / 1.055)));
const linearToSrgb = signed((c) => (c > 0.0031308 ? 1.055 * powerFiveTwelfths(c) - 0.055 : 12.92 * c));
const a98ToLinear = signed(power563Over256);
const prophotoToLinear = signed((c) => (c <= 16 / 512 ? c / 16 : powerNineFifths(c)));
/** The inverse of the camera's function (Rec. ITU-R BT.2020-2), which browsers use. */
const rec2020ToLinear = signed((c) =>
  c < 4.5 * REC2020_BETA ? c / 4.5 : powerTwentyNinths((c + REC2020_ALPHA - 1) / REC2020_ALPHA),
);

function xyzToSrgb(xyz: Triple): Triple {
  return each(apply(XYZ_TO_SRGB, xyz), linearToSrgb);
}

/** Rectangular from hue in degrees. */
export function fromPolar([light, chroma, hue]: Triple): Triple {
  const sc = new Float64Array(2);
  sinCosDegrees(hue, sc);
  return [light, chroma * sc[1], chroma * sc[0]];
}

/** CIE Lab of D50, light from 0 to 100, as sRGB that may lie outside 0 to 1. */
export function labToSrgb([light, a, b]: Triple): Triple {
  const f1 = (light + 16) / 116;
  const back = (f: number): number => (f * f * f > 216 / 24389 ? f * f * f : (116 * f - 16) / (24389 / 27));
  const y = light > 8 ? f1 * f1 * f1 : light / (24389 / 27);
  const xyz: Triple = [back(a / 500 + f1), y, back(f1 - b / 200)];
  const [wx, wy, wz] = WHITE_D50;
  return xyzToSrgb(apply(D50_TO_D65, [xyz[0] * wx, xyz[1] * wy, xyz[2] * wz]));
}

/** Oklab, light from 0 to 1, as sRGB that may lie outside 0 to 1. */
export function oklabToSrgb(lab: Triple): Triple {
  const lms = each(apply(OKLAB_TO_LMS, lab), (c) => c * c * c);
  return xyzToSrgb(apply(LMS_TO_XYZ, lms));
}

/** Linear light to the values that are written. */
export function linearSrgbToSrgb(rgb: Triple): Triple {
  return each(rgb, linearToSrgb);
}

/** The values that are written to linear light. */
export function srgbToLinearSrgb(rgb: Triple): Triple {
  return each(rgb, srgbToLinear);
}

/** sRGB as Oklab, light from 0 to 1. */
export function srgbToOklab(rgb: Triple): Triple {
  const lms = apply(XYZ_TO_LMS, apply(SRGB_TO_XYZ, each(rgb, srgbToLinear)));
  return apply(LMS_TO_OKLAB, each(lms, cubeRoot));
}

/** The spaces of `color()` (CSS Color Module Level 4, §10), to sRGB. */
export const SPACES: ReadonlyMap<string, (c: Triple) => Triple> = new Map<string, (c: Triple) => Triple>([
  ['srgb', (c) => c],
  ['srgb-linear', linearSrgbToSrgb],
  ['display-p3', (c) => xyzToSrgb(apply(P3_TO_XYZ, each(c, srgbToLinear)))],
  ['display-p3-linear', (c) => xyzToSrgb(apply(P3_TO_XYZ, c))],
  ['a98-rgb', (c) => xyzToSrgb(apply(A98_TO_XYZ, each(c, a98ToLinear)))],
  [
    'prophoto-rgb',
    (c) => xyzToSrgb(apply(D50_TO_D65, apply(PROPHOTO_TO_XYZ_D50, each(c, prophotoToLinear)))),
  ],
  ['rec2020', (c) => xyzToSrgb(apply(REC2020_TO_XYZ, each(c, rec2020ToLinear)))],
  ['xyz', xyzToSrgb],
  ['xyz-d65', xyzToSrgb],
  ['xyz-d50', (c) => xyzToSrgb(apply(D50_TO_D65, c))],
]);
