import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';

const mobile = fileURLToPath(new URL('../../apps/mobile', import.meta.url));

/** The characters that a TrueType font has glyphs for, from its Unicode cmap of format 4 (OpenType 1.9, `cmap`). */
function charactersOf(path: string): Set<number> {
  const font = readFileSync(join(mobile, 'node_modules/@expo-google-fonts', path));
  const tables = Array.from({ length: font.readUInt16BE(4) }, (_, index) => 12 + 16 * index);
  const entry = tables.find((at) => font.toString('latin1', at, at + 4) === 'cmap')!;
  const cmap = font.readUInt32BE(entry + 8);
  const subtables = Array.from({ length: font.readUInt16BE(cmap + 2) }, (_, index) => cmap + font.readUInt32BE(cmap + 4 + 8 * index + 4));
  const table = subtables.find((at) => font.readUInt16BE(at) === 4)!;
  const doubled = font.readUInt16BE(table + 6);
  const found = new Set<number>();
  for (let at = 0; at < doubled; at += 2) {
    const last = font.readUInt16BE(table + 14 + at);
    const first = font.readUInt16BE(table + 16 + doubled + at);
    const delta = font.readUInt16BE(table + 16 + 2 * doubled + at);
    const offsetAt = table + 16 + 3 * doubled + at;
    const offset = font.readUInt16BE(offsetAt);
    for (let code = first; code <= last && code !== 0xffff; code += 1) {
      const glyph = offset === 0 ? (code + delta) & 0xffff : font.readUInt16BE(offsetAt + offset + 2 * (code - first));
      if (glyph !== 0) found.add(code);
    }
  }
  return found;
}

const text = charactersOf('atkinson-hyperlegible-next/400Regular/AtkinsonHyperlegibleNext_400Regular.ttf');
const figures = charactersOf('atkinson-hyperlegible-mono/400Regular/AtkinsonHyperlegibleMono_400Regular.ttf');
const symbols = charactersOf('stix-two-text/400Regular_Italic/STIXTwoText_400Regular_Italic.ttf');

function sources(folder: string): string[] {
  return readdirSync(folder).flatMap((name) => {
    const path = join(folder, name);
    return statSync(path).isDirectory() ? sources(path) : /\.tsx?$/.test(name) ? [path] : [];
  });
}

/** Comments are not printed, and may name any symbol; escapes are what they stand for. */
function printed(source: string): string {
  const bare = source.replace(/\/\*[\s\S]*?\*\/|(^|\s)\/\/.*$/gm, '');
  return bare.replace(/\\u([0-9A-Fa-f]{4})/g, (_, code: string) => String.fromCharCode(Number.parseInt(code, 16)));
}

test('every character that the app prints has a glyph in its text font or, next in line, in the font of symbols', () => {
  const missing = sources(join(mobile, 'src')).flatMap((path) =>
    [...new Set(printed(readFileSync(path, 'utf8')))]
      .filter(
        (character) => character.codePointAt(0)! >= 32 && !text.has(character.codePointAt(0)!) && !symbols.has(character.codePointAt(0)!),
      )
      .map((character) => `${character} (U+${character.codePointAt(0)!.toString(16)}) in ${path}`),
  );
  expect(missing).toEqual([]);
});

test('figures and their marks have glyphs of their own width in Mono', () => {
  const marks = [...'0123456789.,+±%°−–/()·²³×'].filter((character) => !figures.has(character.codePointAt(0)!));
  expect(marks).toEqual([]);
});

test('symbols of quantities are in the font that sets them', () => {
  expect([...'ξληθΣχΔσℓµκαβωφρζT²'].filter((character) => !symbols.has(character.codePointAt(0)!))).toEqual([]);
});
