/** Hands a file made in the browser to the person. */
export function download(fileName: string, content: Blob | string, type = 'text/csv;charset=utf-8'): void {
  const address = URL.createObjectURL(content instanceof Blob ? content : new Blob([content], { type }));
  const link = document.createElement('a');
  link.href = address;
  link.download = fileName;
  link.click();
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}

/** A file name from a title: plain letters, digits and hyphens. */
export const fileNameOf = (title: string, ending: string) =>
  `${title
    .normalize('NFKD')
    .replace(/[^\w\s-]/g, '')
    .trim()
    .replace(/\s+/g, '-')
    .toLowerCase()}.${ending}`;
