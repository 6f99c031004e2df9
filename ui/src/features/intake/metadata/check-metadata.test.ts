import { completeness, isStorable, metadataFaults, tidyMetadata } from './check-metadata';

// 0000-0002-1825-0097 is the example of the ORCID documentation of the check digit (ISO 7064 MOD 11-2).
const valid = '0000-0002-1825-0097';

test('empty answers are left out and texts are trimmed', () => {
  expect(tidyMetadata({ title: ' Cores ', note: '  ', creators: [{ name: '' }] })).toEqual({
    title: 'Cores',
  });
});

test('an ORCID iD may be given with its address, and is kept without it', () => {
  expect(tidyMetadata({ creators: [{ name: 'Ann Lee', orcid: `https://orcid.org/${valid}` }] })).toEqual({
    creators: [{ name: 'Ann Lee', orcid: valid }],
  });
});

test('an ORCID iD with a wrong check digit is named at its creator', () => {
  const faults = metadataFaults({
    creators: [
      { name: 'A', orcid: valid },
      { name: 'B', orcid: '0000-0002-1825-0098' },
    ],
  });
  expect(Object.keys(faults)).toEqual(['creators.1.orcid']);
});

test('a creator without a name keeps the form from being saved and says why', () => {
  const metadata = { creators: [{ name: ' ', affiliation: 'Institute' }] };
  expect(metadataFaults(metadata)['creators.0.name']).toMatch(/name/);
  expect(isStorable(metadata)).toBe(false);
  expect(isStorable({ creators: [{ name: 'Ann Lee' }] })).toBe(true);
});

test('a licence with spaces and a DOI given as an address are told how they are written', () => {
  const faults = metadataFaults({ licence: 'CC BY 4.0', publicationDoi: 'https://doi.org/10.1038/x' });
  expect(faults.licence).toMatch(/CC-BY-4\.0/);
  expect(faults.publicationDoi).toMatch(/10\./);
  expect(metadataFaults({ licence: 'CC-BY-4.0', publicationDoi: '10.1038/nature06763' })).toEqual({});
});

test('what is typed counts as answered before it is saved; what the sheet says counts too', () => {
  const missing = ['title', 'licence', 'archive'];
  const before = completeness(missing, {});
  const after = completeness(missing, { licence: 'CC0-1.0' });
  expect(before.wanted.map(({ field }) => field)).toEqual(['title', 'licence', 'archive']);
  expect(after.answered).toBe(before.answered + 1);
});
