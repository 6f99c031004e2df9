import { Button, Tab, TabList } from '@fluentui/react-components';
import { Copy16Regular } from '@fluentui/react-icons';
import type { ExportSummary } from '@siltlight/common/wire/exports';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { useSay } from '../../shared/feedback/toasts';
import { Figure } from '../../shared/figure/figure';
import { fetchSnippet, type Language } from './fetch-snippets';

const languages: Language[] = ['curl', 'Python', 'R'];

/** How to fetch one file from a script. */
export function Snippet({ file }: { file: ExportSummary }) {
  const [language, setLanguage] = useState<Language>('curl');
  const say = useSay();
  const text = fetchSnippet(language, file, window.location.origin);
  const copy = () =>
    navigator.clipboard.writeText(text).then(
      () => say('Copied'),
      () => say('The browser refused to copy', 'Mark the text and copy it yourself.', 'warning'),
    );
  return (
    <Figure
      plain
      title="Fetch it from a script"
      sub={file.fileName}
      controls={
        <TabList
          size="small"
          selectedValue={language}
          onTabSelect={(_, tab) => setLanguage(tab.value as Language)}
          aria-label="Language"
        >
          {languages.map((one) => (
            <Tab key={one} value={one}>
              {one}
            </Tab>
          ))}
        </TabList>
      }
      note={
        <>
          The token is read from the environment variable SILTLIGHT_TOKEN.{' '}
          <Link to="/profile">Make a token</Link> with the right to read.
        </>
      }
    >
      <div className="snippet">
        <pre tabIndex={0} aria-label={`Fetch ${file.title} with ${language}`}>
          {text}
        </pre>
        <Button size="small" icon={<Copy16Regular />} onClick={() => void copy()}>
          Copy
        </Button>
      </div>
    </Figure>
  );
}
