import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { unwrapWoff } from './unwrap-woff.js';

/** The cuts that documents are set in. */
export const faces = ['regular', 'italic', 'semibold', 'bold'] as const;
export type Face = (typeof faces)[number];

/** Source Sans 3 comes in pieces by script; a letter is taken from the first piece that has it. */
export const scripts = [
  'latin',
  'latin-ext',
  'greek',
  'cyrillic',
  'vietnamese',
  'greek-ext',
  'cyrillic-ext',
] as const;
export type Script = (typeof scripts)[number];

const cuts: Record<Face, string> = {
  regular: '400-normal',
  italic: '400-italic',
  semibold: '600-normal',
  bold: '700-normal',
};

/** One font as pdfkit reads it. */
export interface FontFile {
  readonly face: Face;
  readonly script: Script;
  readonly bytes: Buffer;
}

let read: Promise<FontFile[]> | undefined;

/** Read once and kept: the files never change while the program runs. A failed reading is tried again. */
export const readFontFiles = (): Promise<FontFile[]> => {
  read ??= readAll().catch((fault: unknown) => {
    read = undefined;
    throw fault;
  });
  return read;
};

const readAll = (): Promise<FontFile[]> => {
  const { resolve } = createRequire(import.meta.url);
  return Promise.all(
    faces.flatMap((face) =>
      scripts.map(async (script) => ({
        face,
        script,
        bytes: unwrapWoff(
          await readFile(
            resolve(`@fontsource/source-sans-3/files/source-sans-3-${script}-${cuts[face]}.woff`),
          ),
        ),
      })),
    ),
  );
};
