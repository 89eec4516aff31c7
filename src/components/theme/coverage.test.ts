import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { brotliDecompressSync } from 'node:zlib';
import ts from 'typescript';
import { describe, expect, it } from 'vitest';

const here = import.meta.dirname;
const src = path.resolve(here, '../..');
const modules = path.resolve(src, '../node_modules');

interface Face {
  readonly file: string;
  readonly range: ReadonlySet<number>;
  readonly holds: ReadonlySet<number>;
}

/** The shipped faces: what the style sheet promises for each, and what the file holds. */
const faces: readonly Face[] = [
  ...readFileSync(path.join(here, 'fonts.css'), 'utf8').matchAll(/@font-face\s*{([^}]*)}/g),
].map(([, body = '']) => {
  const url = /url\('([^']+)'\)/.exec(body)?.[1] ?? '';
  const file = url.startsWith('.') ? path.join(here, url) : path.join(modules, url);
  return {
    file,
    range: rangeOf(/unicode-range:([^;]+);/.exec(body)?.[1] ?? ''),
    holds: characterMap(readFileSync(file)),
  };
});

describe('shipped faces', () => {
  it.each(faces.map((face) => [path.basename(face.file), face] as const))(
    '%s holds all that its range promises',
    (_name, face) => {
      const missing = [...face.range]
        .filter((code) => !face.holds.has(code))
        .map((code) => `U+${code.toString(16)}`);
      expect(face.range.size).toBeGreaterThan(10);
      expect(missing).toEqual([]);
    },
  );

  it('cover the signs that the trade writes', () => {
    for (const sign of 'µμΩΔσταβγηλπρφ√≤≥≈→±×·°²³−\u2009\u202f\u00a0–…’')
      expect(isCovered(sign), sign).toBe(true);
  });

  it('do not cover what no file holds', () => {
    expect(isCovered('₂')).toBe(false);
    expect(isCovered('漢')).toBe(false);
  });
});

describe('words of the app', () => {
  it('use no character that would fall back to another face', () => {
    const strays = sourceFiles(src)
      .filter(mayStray)
      .flatMap((file) =>
        [...new Set(stringsOf(file).join(''))]
          // U+FFFF is no character: stores use it as the upper end of a range of keys.
          .filter((sign) => sign > '\u007e' && sign !== '\uffff' && !isCovered(sign))
          .map((sign) => `${path.relative(src, file)}: U+${(sign.codePointAt(0) ?? 0).toString(16)} ${sign}`),
      );
    expect(strays).toEqual([]);
  });
});

/** Parsing every file takes seconds; most hold no such character, not even in a comment or as an escape. */
function mayStray(file: string): boolean {
  const text = readFileSync(file, 'utf8');
  const escaped = [...text.matchAll(/\\u(?:\{([0-9a-f]+)\}|([0-9a-f]{4}))/gi)].map(([, long, short]) =>
    String.fromCodePoint(Number.parseInt(long ?? short ?? '0', 16)),
  );
  return [...Array.from(text), ...escaped].some((sign) => sign > '\u007e' && !isCovered(sign));
}

function isCovered(sign: string): boolean {
  const code = sign.codePointAt(0) ?? 0;
  return faces.some((face) => face.range.has(code));
}

function rangeOf(text: string): ReadonlySet<number> {
  const codes = new Set<number>();
  for (const [, from = '', to] of text.matchAll(/U\+([0-9A-F]+)(?:-([0-9A-F]+))?/gi)) {
    for (let code = Number.parseInt(from, 16); code <= Number.parseInt(to ?? from, 16); code += 1)
      codes.add(code);
  }
  return codes;
}

function sourceFiles(folder: string): string[] {
  if (!existsSync(folder)) return [];
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const full = path.join(folder, entry.name);
    if (entry.isDirectory()) return sourceFiles(full);
    return /(?<!\.test|\.d)\.tsx?$/.test(entry.name) ? [full] : [];
  });
}

/** What can reach the screen: string literals, templates and text between tags, never comments. */
function stringsOf(file: string): string[] {
  const found: string[] = [];
  const visit = (node: ts.Node): void => {
    if (
      ts.isStringLiteralLike(node) ||
      ts.isTemplateHead(node) ||
      ts.isTemplateMiddleOrTemplateTail(node) ||
      ts.isJsxText(node)
    ) {
      found.push(node.text);
    }
    ts.forEachChild(node, visit);
  };
  const kind = file.endsWith('x') ? ts.ScriptKind.TSX : ts.ScriptKind.TS;
  visit(ts.createSourceFile(file, readFileSync(file, 'utf8'), ts.ScriptTarget.ES2023, false, kind));
  return found;
}

/** Code points of a woff2 file. Layout by W3C "WOFF File Format 2.0", 4 and 5; the map by OpenType "cmap", formats 4 and 12. */
function characterMap(file: Buffer): ReadonlySet<number> {
  const tables = file.readUInt16BE(12);
  let at = 48;
  let offset = 0;
  let cmap: { readonly offset: number; readonly length: number } | undefined;
  const base128 = (): number => {
    let value = 0;
    for (;;) {
      const byte = file.readUInt8(at);
      at += 1;
      value = value * 128 + (byte & 0x7f);
      if ((byte & 0x80) === 0) return value;
    }
  };
  for (let i = 0; i < tables; i += 1) {
    const flags = file.readUInt8(at);
    at += 1;
    const tag = flags & 0x3f;
    if (tag === 63) at += 4;
    const version = flags >> 6;
    const original = base128();
    const isOutline = tag === 10 || tag === 11;
    const transformed = isOutline ? version !== 3 : version !== 0;
    const length = transformed ? base128() : original;
    if (tag === 0) cmap = { offset, length };
    offset += length;
  }
  if (cmap === undefined) throw new Error('no character map');
  const data = brotliDecompressSync(file.subarray(at, at + file.readUInt32BE(20)));
  return readCmap(data.subarray(cmap.offset, cmap.offset + cmap.length));
}

function readCmap(table: Buffer): ReadonlySet<number> {
  const codes = new Set<number>();
  for (let i = 0; i < table.readUInt16BE(2); i += 1) {
    const at = table.readUInt32BE(4 + i * 8 + 4);
    const format = table.readUInt16BE(at);
    if (format === 4) {
      const segments = table.readUInt16BE(at + 6) / 2;
      for (let s = 0; s < segments; s += 1) {
        const end = table.readUInt16BE(at + 14 + 2 * s);
        const start = table.readUInt16BE(at + 16 + 2 * segments + 2 * s);
        for (let code = start; code <= end && code < 0xffff; code += 1) codes.add(code);
      }
    }
    if (format === 12) {
      for (let g = 0; g < table.readUInt32BE(at + 12); g += 1) {
        const group = at + 16 + 12 * g;
        for (let code = table.readUInt32BE(group); code <= table.readUInt32BE(group + 4); code += 1)
          codes.add(code);
      }
    }
  }
  return codes;
}
