// @vitest-environment node
/// <reference types="node" />
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import ts from 'typescript';
import { glyphsOf } from './woff-glyphs';

const root = path.resolve(import.meta.dirname, '../..');
const font = (name: string) => path.join(root, 'node_modules', name);

const lato = ['latin-400', 'latin-700', 'latin-ext-400', 'latin-ext-700'].map((subset) =>
  glyphsOf(font(`@fontsource/lato/files/lato-${subset}-normal.woff`)),
);
const greek = glyphsOf(font('katex/dist/fonts/KaTeX_Math-Italic.woff'));
const isLowerGreek = (point: number) => point >= 0x3b1 && point <= 0x3c9;

/** In both weights, as any text may stand in a heading; lower-case Greek comes from the second face. */
const isDrawn = (point: number) =>
  (point < 32 && /\s/.test(String.fromCodePoint(point))) ||
  (isLowerGreek(point) && greek.has(point)) ||
  [400, 700].every((weight) =>
    lato.some((face, at) => [400, 700, 400, 700][at] === weight && face.has(point)),
  );

/** Texts of a source file that may reach the screen: strings, templates, words between tags. */
function textsOf(file: string): string[] {
  const source = ts.createSourceFile(file, readFileSync(file, 'utf8'), ts.ScriptTarget.Latest, true);
  const texts: string[] = [];
  const visit = (node: ts.Node) => {
    if (
      ts.isStringLiteralLike(node) ||
      ts.isJsxText(node) ||
      ts.isTemplateMiddleOrTemplateTail(node) ||
      ts.isTemplateHead(node)
    ) {
      texts.push(node.text);
    }
    ts.forEachChild(node, visit);
  };
  visit(source);
  return texts;
}

const sources = readdirSync(path.join(root, 'ui/src'), { recursive: true, encoding: 'utf8' })
  .filter((file) => /\.tsx?$/.test(file) && !/\.test\.tsx?$/.test(file))
  .map((file) => path.join('ui/src', file));

test('the shipped Lato draws letters, digits and the true minus, but no raised minus', () => {
  expect(['a', 'Z', '0', '\u2212', '–', '±', '°'].filter((sign) => !isDrawn(sign.codePointAt(0)!))).toEqual(
    [],
  );
  expect(isDrawn(0x207b)).toBe(false);
});

test('the second face draws the Greek letters of the formulas', () => {
  expect(['τ', 'λ', 'ω', 'α', 'σ', 'μ'].filter((sign) => !isDrawn(sign.codePointAt(0)!))).toEqual([]);
});

test('no text of the client needs a glyph outside the shipped fonts', () => {
  expect(sources.length).toBeGreaterThan(50);
  const missing = sources.flatMap((file) =>
    textsOf(path.join(root, file)).flatMap((text) =>
      [...text]
        .filter((sign) => !isDrawn(sign.codePointAt(0)!))
        .map((sign) => `${file}: ${sign} (U+${sign.codePointAt(0)!.toString(16)})`),
    ),
  );
  expect(missing).toEqual([]);
});
