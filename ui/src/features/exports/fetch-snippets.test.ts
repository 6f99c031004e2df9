import { fetchSnippet, type Language } from './fetch-snippets';

const wanted = { id: 'e1', fileName: 'lgm regions; rm -rf.csv', sha256: 'ab12' };

test.each<Language>(['curl', 'Python', 'R'])(
  '%s fetches the file with a token and names its checksum',
  (language) => {
    const text = fetchSnippet(language, wanted, 'https://silt.example');
    expect(text).toContain('https://silt.example/api/v1/exports/e1/file');
    expect(text).toContain('SILTLIGHT_TOKEN');
    expect(text).toContain('Bearer');
    expect(text).toContain('ab12');
  },
);

test('a file name with signs that a shell would read is made plain', () => {
  expect(fetchSnippet('curl', wanted, 'https://silt.example')).toContain('--output lgm_regions__rm_-rf.csv ');
});
