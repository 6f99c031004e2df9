import { ar6Regions } from '@siltlight/common/sphere/region-set';
import { mix, placeOnRamp, ramps } from '../theme/ramps';
import { partsOf, siteDiameterPx } from './map-option';
import { worldShapes } from './world';

test('the picked region is drawn last, the one pointed at just before it', () => {
  const parts = partsOf({ regions: ar6Regions(), limit: 1, selected: 'SAH', hovered: 'MED' });
  expect(parts.at(-1)!.region.code).toBe('SAH');
  expect(parts.at(-2)!.region.code).toBe('MED');
  expect(parts).toHaveLength(ar6Regions().reduce((sum, region) => sum + region.parts.length, 0));
});

test('no coast jumps across the antimeridian', () => {
  const shapes = worldShapes();
  if (shapes.type !== 'FeatureCollection') throw new Error('The world is a collection of features.');
  const land = shapes.features.find((shape) => shape.properties?.name === 'land')!;
  if (land.geometry.type !== 'MultiPolygon') throw new Error('Land is made of polygons.');
  const jumps = land.geometry.coordinates.flatMap((polygon) =>
    polygon.flatMap((ring) =>
      ring
        .slice(1)
        .filter((point, at) => Math.abs(point[0]! - ring[at]![0]!) > 180 && Math.abs(point[1]!) < 85),
    ),
  );
  expect(jumps).toEqual([]);
});

test('forcing is symmetric about zero, flux follows its logarithm, and both stop at their ends', () => {
  expect(placeOnRamp('forcing', 0, 3, 0)).toBe(0.5);
  expect(placeOnRamp('forcing', -3, 3, 0)).toBe(0);
  expect(placeOnRamp('flux', 1, 100, 0.01)).toBeCloseTo(0.5, 12);
  expect(placeOnRamp('flux', 0, 100, 0.01)).toBe(0);
  expect(mix(ramps.forcing.light, 7)).toEqual(mix(ramps.forcing.light, 1));
});

test('the area of a site mark grows with its samples', () => {
  expect(siteDiameterPx(0)).toBe(3);
  expect(siteDiameterPx(100)).toBeCloseTo(9.2, 9);
});
