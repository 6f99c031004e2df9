import fc from 'fast-check';
import { canonicalJson, checksumOf } from './canonical';

// RFC 8785 (JSON Canonicalization Scheme), sections 3.2.2 and 3.2.3 and appendix B; values from memory.
test('the worked examples of RFC 8785 come out as printed there', () => {
  const example = {
    numbers: [Number('333333333.33333329'), 1e30, 4.5, 2e-3, 0.000000000000000000000000001],
    string: '\u20ac$\u000F\u000aA\'\u0042\u0022\u005c\\"/',
    literals: [null, true, false],
  };
  expect(canonicalJson(example)).toBe(
    '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],' +
      '"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
  );
});

test('members are sorted by UTF-16 code units, so that an emoji comes before a Hebrew presentation form', () => {
  const sorted = canonicalJson({
    '\u20ac': 1,
    '\r': 2,
    '\ufb33': 3,
    '1': 4,
    '\ud83d\ude00': 5,
    '\u0080': 6,
    '\u00f6': 7,
  });
  expect(Object.values(JSON.parse(sorted) as object)).toEqual([4, 2, 6, 7, 1, 5, 3]);
});

test('the order in which members were set does not change the checksum, and any value does', () => {
  expect(checksumOf({ a: 1, b: { d: 1, c: 2 } })).toBe(checksumOf({ b: { c: 2, d: 1 }, a: 1 }));
  expect(checksumOf({ a: 1 })).not.toBe(checksumOf({ a: 1.0000000000000002 }));
  expect(checksumOf({ a: 1, b: undefined })).toBe(checksumOf({ a: 1 }));
});

// The example of reference/decisions/0010-canonical-form-and-checksum.md; its sum was taken with Python's hashlib.
test('the example of the written description has the checksum stated there', () => {
  const content = { unit: 'g m-2 yr-1', flux: [0.1, 1e21, -0, 1.5], site: 'Dôme C\n', note: null };
  expect(checksumOf(content)).toBe('1ae483a0899506680890aa7a94ee9dcc0537a5785898623c7092146bb677f37e');
});

test('what is read back from the canonical form has the same canonical form', () => {
  fc.assert(
    fc.property(fc.jsonValue(), (value) => {
      const text = canonicalJson(value);
      expect(canonicalJson(JSON.parse(text))).toBe(text);
    }),
  );
});

test.each([NaN, Infinity, () => 1, new Date(0), new Float64Array(1), new Map(), 1n, '\ud800', [undefined]])(
  'what JSON cannot say (%p) has no canonical form',
  (value) => {
    expect(() => canonicalJson({ deep: [value] })).toThrow(TypeError);
  },
);
