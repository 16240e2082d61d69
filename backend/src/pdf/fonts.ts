import { readFileSync } from 'node:fs';
import type PDFDocument from 'pdfkit';

/** The type faces as files. These are full fonts: the ones for browsers lack most letters. */
const FILES = {
  body: require.resolve('@expo-google-fonts/work-sans/400Regular/WorkSans_400Regular.ttf'),
  medium: require.resolve('@expo-google-fonts/work-sans/500Medium/WorkSans_500Medium.ttf'),
  strong: require.resolve('@expo-google-fonts/work-sans/600SemiBold/WorkSans_600SemiBold.ttf'),
  mono: require.resolve('@expo-google-fonts/ibm-plex-mono/400Regular/IBMPlexMono_400Regular.ttf'),
  monoMedium: require.resolve('@expo-google-fonts/ibm-plex-mono/500Medium/IBMPlexMono_500Medium.ttf'),
} as const;

export type Face = keyof typeof FILES;

/** What a letter that the face lacks is printed as: seen at once, and not mistaken for a word. */
export const SUBSTITUTES: Readonly<Record<Face, string>> = {
  body: '□',
  medium: '□',
  strong: '□',
  mono: '◊',
  monoMedium: '◊',
};

/**
 * Makes the faces known to a document under their names, each opened at its first use. `doc.table` must not be used with
 * them: it restores the font by its source, which opens and parses the file again for every cell.
 */
export function registerFaces(doc: InstanceType<typeof PDFDocument>): void {
  for (const face of Object.keys(FILES) as Face[]) doc.registerFont(face, sourceOf(face));
}

const padded = new Map<Face, Buffer>();

/**
 * In IBM Plex Mono the space is an empty glyph at the very end of the file, and the font reader looks at an empty glyph's
 * header too: past the end, where it throws. A few zeros there make it read "no contours".
 */
function sourceOf(face: Face): string | Buffer {
  if (face !== 'mono' && face !== 'monoMedium') return FILES[face];
  const known = padded.get(face) ?? Buffer.concat([readFileSync(FILES[face]), Buffer.alloc(64)]);
  padded.set(face, known);
  return known;
}
