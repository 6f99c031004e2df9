const SUBJECT_MAX = 200;
const LINE_MAX = 2000;
/** Line breaks and other controls, and the marks that turn the direction of writing. */
const UNSAFE = /[\p{Cc}\p{Cs}\p{Zl}\p{Zp}\u200e\u200f\u061c\u202a-\u202e\u2066-\u2069]+/gu;

/** Titles and names are people's own text: none may start a second header or hide what follows. */
export function oneLine(text: string, maxLength = LINE_MAX): string {
  const line = text.replace(UNSAFE, ' ').replace(/ {2,}/g, ' ').trim();
  return line.length <= maxLength ? line : `${line.slice(0, maxLength - 1)}…`;
}

export function subjectOf(subject: string): string {
  return oneLine(subject, SUBJECT_MAX);
}

export function bodyOf(name: string, lines: string[], link: string | undefined): string {
  const paragraphs = [`Hello ${oneLine(name, 120)},`, ...lines.map((line) => oneLine(line))];
  if (link) paragraphs.push(link);
  return `${paragraphs.join('\n\n')}\n\n-- \nSiltlight\n`;
}

export function htmlOf(body: string): string {
  const escaped = body.replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);
  return `<!doctype html><html lang="en"><body><pre style="font: inherit; white-space: pre-wrap">${escaped}</pre></body></html>`;
}
