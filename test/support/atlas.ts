import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { feature } from 'topojson-client';
import type { GeometryCollection, MultiPolygon, Polygon, Topology } from 'topojson-specification';

/**
 * The countries of the npm package world-atlas 2.0.2 (ISC licence; data of Natural Earth, in the public
 * domain) as TopoJSON, turned into polygons by topojson-client 3.1.0 (ISC licence): development
 * dependencies only.
 */
/** By ISO 3166-1. */
const ANTARCTICA = '010';

export type Atlas = Topology<{ countries: GeometryCollection }>;

/** Without Antarctica, whose outline in the finer atlas runs along the pole and back again. */
export function readAtlas(scale: '110m' | '50m'): Atlas {
  const path = createRequire(import.meta.url).resolve(`world-atlas/countries-${scale}.json`);
  const atlas: Atlas = JSON.parse(readFileSync(path, 'utf8'));
  const { countries } = atlas.objects;
  const geometries = countries.geometries.filter(({ id }) => id !== ANTARCTICA);
  return { ...atlas, objects: { countries: { ...countries, geometries } } };
}

/**
 * Every country a path of closed polygons, so that shared borders stand twice; one degree is `mmPerDegree`.
 * Equirectangular: longitude and latitude as they are; four decimals are finer than the file's own grid.
 */
export function atlasAsSvg(atlas: Atlas, mmPerDegree: number, decimals = 4): string {
  const [width, height] = [360 * mmPerDegree, 180 * mmPerDegree];
  const paths = feature(atlas, atlas.objects.countries).features.map(({ geometry }) => {
    const { type, coordinates } = geometry as GeoJSON.Polygon | GeoJSON.MultiPolygon;
    const rings = type === 'Polygon' ? coordinates : coordinates.flat();
    const data = rings.map(
      (ring) =>
        `M${ring
          .slice(0, -1)
          .map(([longitude, latitude]) => `${longitude.toFixed(decimals)},${(-latitude).toFixed(decimals)}`)
          .join('L')}Z`,
    );
    return `<path d="${data.join('')}"/>`;
  });
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${width}mm" height="${height}mm" viewBox="-180 -90 360 180" fill="none" stroke="#000" stroke-width=".1">\n${paths.join('\n')}\n</svg>\n`;
}

export interface Borders {
  /** Lengths in degrees of the plane: every border once, and what stands there beyond once. */
  readonly once: number;
  readonly beyondOnce: number;
  /** Borders that hang together, the places where an odd number of them meets, and what follows from both. */
  readonly components: number;
  readonly oddPlaces: number;
  readonly fewestRuns: number;
}

/** What the topology says of the borders: no geometry is compared, shared arcs are shared by their number. */
export function bordersOf({ arcs, transform, objects }: Atlas): Borders {
  const uses = new Map<number, number>();
  for (const geometry of objects.countries.geometries) {
    for (const arc of [(geometry as Polygon | MultiPolygon).arcs].flat(3)) {
      const index = arc < 0 ? ~arc : arc;
      uses.set(index, (uses.get(index) ?? 0) + 1);
    }
  }
  const [scaleX, scaleY] = transform!.scale;
  const degree = new Map<string, number>();
  const parent = new Map<string, string>();
  const top = (place: string): string => {
    const up = parent.get(place) ?? place;
    return up === place ? place : top(up);
  };
  let [once, beyondOnce] = [0, 0];
  for (const [index, count] of uses) {
    // Quantized arcs hold the first point, then steps (TopoJSON Format Specification, §2.1.3 and §2.1.4).
    let [x, y] = arcs[index][0];
    const start = `${x} ${y}`;
    let length = 0;
    for (const [dx, dy] of arcs[index].slice(1)) {
      length += Math.hypot(dx * scaleX, dy * scaleY);
      [x, y] = [x + dx, y + dy];
    }
    once += length;
    beyondOnce += length * (count - 1);
    const end = `${x} ${y}`;
    for (const place of [start, end]) degree.set(place, (degree.get(place) ?? 0) + 1);
    parent.set(top(start), top(end));
  }
  const oddOf = new Map<string, number>();
  for (const [place, count] of degree) oddOf.set(top(place), (oddOf.get(top(place)) ?? 0) + (count % 2));
  const odd = [...oddOf.values()];
  return {
    once,
    beyondOnce,
    components: odd.length,
    oddPlaces: odd.reduce((sum, n) => sum + n, 0),
    // Half as many trails as odd vertices, one where there is none (Listing 1847).
    fewestRuns: odd.reduce((sum, n) => sum + Math.max(1, n / 2), 0),
  };
}
