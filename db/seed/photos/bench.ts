import { type LinearRgb, labToLinearRgb } from './colour';
import type { Ground } from './grounds';
import { fractalNoise, planeNoise, type Random } from './noise';

// Taken out of Math once: the look-up of a global costs more than the call where a test runner wraps it.
const { max, min, sin } = Math;

/** Colour of the surface around the plate at a point of the bench, mm from the plate's corner. */
export type Bench = (xMm: number, yMm: number) => LinearRgb;

export function benchOf(kind: Ground['bench'], random: Random): Bench {
  switch (kind) {
    case 'rubber mat':
      return rubberMat(random);
    case 'birch board':
      return birchBoard(random);
  }
}

/** Dark grey mat with a fine pebble; the pebble's lattice is turned so that it follows no edge of the plate. */
function rubberMat(random: Random): Bench {
  const [red, green, blue] = labToLinearRgb([25, -0.3, -1.2]);
  const pebble = planeNoise(random);
  const dust = planeNoise(random);
  return (xMm, yMm) => {
    const u = 0.8 * xMm + 0.6 * yMm;
    const v = 0.8 * yMm - 0.6 * xMm;
    const grain = pebble(u * 2.6, v * 2.6) + 0.7 * pebble(v * 4.7 + 11, u * 4.7);
    const shade = max(0.2, 1 + 0.13 * grain + 0.2 * fractalNoise(dust, u / 19, v / 19, 3));
    return [red * shade, green * shade, blue * shade];
  };
}

/** Pale plywood with a slow grain along x. */
function birchBoard(random: Random): Bench {
  const pale = labToLinearRgb([76, 4.5, 17]);
  const dark = labToLinearRgb([66, 7.5, 22]);
  const figure = planeNoise(random);
  const fibre = planeNoise(random);
  return (xMm, yMm) => {
    const ring = yMm / 7 + 1.6 * fractalNoise(figure, xMm / 70, yMm / 22, 2);
    const late = (0.5 + 0.5 * sin(ring * 2 * Math.PI)) ** 3;
    const mix = min(1, max(0, 0.75 * late + 0.28 * fibre(xMm / 3.2, yMm * 3.5)));
    return [pale[0] + (dark[0] - pale[0]) * mix, pale[1] + (dark[1] - pale[1]) * mix, pale[2] + (dark[2] - pale[2]) * mix];
  };
}
