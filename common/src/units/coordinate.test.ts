import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Axis, type CoordinateProblem, isCoordinateProblem, parseCoordinate } from './coordinate';
import { letterOMeaning } from './hemisphere';

const degrees = (text: string, axis: Axis): number => {
  const result = parseCoordinate(text, axis);
  if (isCoordinateProblem(result)) throw new Error(result.message);
  return result.degrees;
};

describe('coordinates', () => {
  test.each([
    ["75°06'S", -75.1],
    ['75 06 S', -75.1],
    ['75º06’S', -75.1],
    ['75°06\'30"S', -75.108333333],
    ['S75:06:30', -75.108333333],
    ['75d06m00s S', -75.1],
    ['75 deg 06 min S', -75.1],
    ['75° 6′ 0″ N', 75.1],
    ['75.1S', -75.1],
    ['-75,10', -75.1],
    ['−75.10', -75.1],
    ['75,1° Süd', -75.1],
    ['75.1 ю.ш.', -75.1],
    ['+75.1', 75.1],
  ])('the latitude %s is %d', (text, expected) => expect(degrees(text, 'latitude')).toBeCloseTo(expected, 8));

  test.each([
    ["123°21'E", 123.35],
    ["123°21' Ost", 123.35],
    ['42°19\'12"W', -42.32],
    ['42.32 Ouest', -42.32],
    ['42.32 Oeste', -42.32],
    ['317.68', -42.32],
    ['360', 0],
    ['180', 180],
    ['-180', -180],
  ])('the longitude %s is %d', (text, expected) =>
    expect(degrees(text, 'longitude')).toBeCloseTo(expected, 8),
  );

  test.each([
    ['91', 'latitude', 'outside-range'],
    ['361', 'longitude', 'outside-range'],
    ['-75 S', 'latitude', 'sign-and-letter'],
    ["75°66'S", 'latitude', 'not-a-coordinate'],
    ['abc', 'latitude', 'not-a-coordinate'],
    ['', 'latitude', 'not-a-coordinate'],
    ['75 N', 'longitude', 'wrong-axis'],
    ['12.5 O', 'longitude', 'ambiguous-hemisphere'],
  ] as [string, Axis, string][])('"%s" as %s is refused: %s', (text, axis, code) => {
    expect((parseCoordinate(text, axis) as CoordinateProblem).code).toBe(code);
  });

  test('the letter O is read only where the column or the language of its heading tells east from west', () => {
    expect(letterOMeaning(['12 O', '3 W'], 'lon')).toBe('east');
    expect(letterOMeaning(['12 O', '3 E'], 'lon')).toBe('west');
    expect(letterOMeaning(['12 O'], 'Länge')).toBe('east');
    expect(letterOMeaning(['12 O'], 'Longitude')).toBe('west');
    expect(letterOMeaning(['12 O'], 'x')).toBeUndefined();
    expect(parseCoordinate('12.5 O', 'longitude', { letterO: 'west' })).toMatchObject({ degrees: -12.5 });
  });

  test('a position written in degrees, minutes and seconds reads back to a ten-thousandth of a second', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 179 }),
        fc.integer({ min: 0, max: 59 }),
        fc.integer({ min: 0, max: 59 }),
        fc.boolean(),
        (d, m, s, west) => {
          const expected = (d + m / 60 + s / 3600) * (west ? -1 : 1);
          expect(degrees(`${d}°${m}'${s}"${west ? 'W' : 'E'}`, 'longitude')).toBeCloseTo(expected, 8);
          expect(degrees(`${d} ${m} ${s} ${west ? 'west' : 'east'}`, 'longitude')).toBeCloseTo(expected, 8);
        },
      ),
    );
  });

  test('a longitude of 0 to 360 and its signed form are the same place', () => {
    fc.assert(
      fc.property(fc.double({ min: -179.9, max: -0.001, noNaN: true }), (signed) => {
        const written = Number(signed.toFixed(6));
        expect(degrees((written + 360).toFixed(6), 'longitude')).toBeCloseTo(written, 6);
      }),
    );
  });
});
