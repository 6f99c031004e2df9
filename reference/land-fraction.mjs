import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { feature } from 'topojson-client';

/** Sample points per degree; a cell of 2° holds 8 × 8 of them. */
const SAMPLES_PER_DEGREE = 4;
const COLUMNS = 360 * SAMPLES_PER_DEGREE;
const ROWS = 180 * SAMPLES_PER_DEGREE;

/**
 * Share of land in cells of `stepDeg`, as the number of land points among the points of a 0.25° lattice.
 * The outline is one curve system on the sphere, so along a meridian or a parallel every crossing switches between
 * land and sea. The walk starts on the sea at the North Pole, runs south along the first meridian of the lattice,
 * then east along each parallel. No polygon is cut at 180°, and a ring around the South Pole needs no special case.
 *
 * @returns {number[][]} counts, rows from 90° S northwards, columns from 180° W eastwards
 */
export function landCounts(stepDeg = 2) {
  const edges = outlineEdges();
  const perCell = stepDeg * SAMPLES_PER_DEGREE;
  const counts = Array.from({ length: 180 / stepDeg }, () => new Array(360 / stepDeg).fill(0));
  const crossings = crossingsByRow(edges);
  const firstColumnIsLand = walkFirstMeridian(edges);
  crossings.forEach((longitudes, row) => {
    longitudes.sort((a, b) => a - b);
    let land = firstColumnIsLand[row];
    let next = 0;
    for (let column = 0; column < COLUMNS; column += 1) {
      const longitude = centre(column, -180);
      while (next < longitudes.length && longitudes[next] <= longitude) {
        if (longitudes[next] > centre(0, -180)) land = !land;
        next += 1;
      }
      if (land) counts[Math.floor(row / perCell)][Math.floor(column / perCell)] += 1;
    }
  });
  return counts;
}

const centre = (index, start) => start + (index + 0.5) / SAMPLES_PER_DEGREE;

function outlineEdges() {
  const file = createRequire(import.meta.url).resolve('world-atlas/land-50m.json');
  const topology = JSON.parse(readFileSync(file, 'utf8'));
  const land = feature(topology, topology.objects.land);
  const edges = [];
  for (const { geometry } of land.features) {
    for (const ring of geometry.coordinates.flat()) {
      for (let i = 1; i < ring.length; i += 1) {
        const [lonA, latA] = ring[i - 1];
        const [lonB, latB] = ring[i];
        // The short way round: an edge over 180° runs on beyond it.
        edges.push({ lonA, latA, lonB: lonA + ((lonB - lonA + 540) % 360) - 180, latB });
      }
    }
  }
  return edges;
}

function crossingsByRow(edges) {
  const rows = Array.from({ length: ROWS }, () => []);
  for (const { lonA, latA, lonB, latB } of edges) {
    const [low, high] = latA < latB ? [latA, latB] : [latB, latA];
    const first = Math.max(0, Math.ceil((low + 90) * SAMPLES_PER_DEGREE - 0.5));
    for (let row = first; row < ROWS && centre(row, -90) < high; row += 1) {
      const longitude = lonA + ((lonB - lonA) * (centre(row, -90) - latA)) / (latB - latA);
      rows[row].push(((longitude + 540) % 360) - 180);
    }
  }
  return rows;
}

function walkFirstMeridian(edges) {
  const meridian = centre(0, -180);
  const latitudes = [];
  for (const { lonA, latA, lonB, latB } of edges) {
    for (const shifted of [meridian, meridian + 360]) {
      if (lonA <= shifted !== lonB <= shifted) {
        latitudes.push(latA + ((latB - latA) * (shifted - lonA)) / (lonB - lonA));
      }
    }
  }
  return Array.from({ length: ROWS }, (_, row) => {
    const crossed = latitudes.filter((latitude) => latitude > centre(row, -90)).length;
    return crossed % 2 === 1;
  });
}
