import { ArrowUpload24Regular } from '@fluentui/react-icons';
import { useState, type DragEvent, type ReactNode } from 'react';

const carriesFiles = (event: DragEvent) => event.dataTransfer.types.includes('Files');

/** The whole page takes a dropped file; while one hovers, it says so. */
export function DropAnywhere({ onFile, children }: { onFile: (file: File) => void; children: ReactNode }) {
  const [over, setOver] = useState(false);
  const drop = (event: DragEvent) => {
    if (!carriesFiles(event)) return;
    event.preventDefault();
    setOver(false);
    const [first] = event.dataTransfer.files;
    if (first) onFile(first);
  };
  return (
    <div
      className="drop-anywhere"
      data-testid="drop-anywhere"
      onDragEnter={(event) => carriesFiles(event) && setOver(true)}
      onDragOver={(event) => carriesFiles(event) && event.preventDefault()}
      onDragLeave={(event) =>
        !event.currentTarget.contains(event.relatedTarget as Node | null) && setOver(false)
      }
      onDrop={drop}
    >
      {children}
      {over && (
        <div className="drop-veil" aria-hidden="true">
          <p>
            <ArrowUpload24Regular />
            Drop it to start a submission
          </p>
        </div>
      )}
    </div>
  );
}
