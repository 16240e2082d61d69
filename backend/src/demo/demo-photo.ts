import { Jimp, JimpMime } from 'jimp';

/** Everything in the picture is placed on a field of this size, then scaled. */
const FIELD_WIDTH = 800;
const FIELD_HEIGHT = 600;

/**
 * A drawn stand-in for a site photo: a coil's fins behind a pipe, and a dial. Demo data only, and plainly a drawing.
 *
 * @param random 0 to 1, repeatable
 * @param width in pixels; the height is three quarters of it
 * @returns a JPEG without metadata
 */
export async function drawDemoPhoto(random: () => number, width = FIELD_WIDTH): Promise<Buffer> {
  const scale = width / FIELD_WIDTH;
  const image = new Jimp({ width, height: Math.round(FIELD_HEIGHT * scale), color: 0xd8dcd6ff });
  const pitch = 10 + Math.floor(random() * 10);
  const pipeY = 140 + Math.floor(random() * 200);
  const [dialX, dialY, dialR] = [200 + random() * 400, 300 + random() * 110, 100 + random() * 32];
  const needle = random() * Math.PI * 1.5 + Math.PI * 0.75;
  const { data } = image.bitmap;
  let index = 0;
  for (let row = 0; row < image.height; row += 1) {
    for (let column = 0; column < width; column += 1) {
      const [x, y] = [column / scale, row / scale];
      const distance = Math.hypot(x - dialX, y - dialY);
      const isNeedle = distance < dialR && onNeedle(x - dialX, y - dialY, needle, dialR);
      const colour = colourAt(x, y, { pitch, pipeY, distance, dialR, isNeedle });
      const grain = Math.floor(random() * 14) - 7;
      data[index] = clamp((colour[0] ?? 0) + grain);
      data[index + 1] = clamp((colour[1] ?? 0) + grain);
      data[index + 2] = clamp((colour[2] ?? 0) + grain);
      index += 4;
    }
  }
  return image.getBuffer(JimpMime.jpeg, { quality: 80 });
}

interface Scene {
  readonly pitch: number;
  readonly pipeY: number;
  readonly distance: number;
  readonly dialR: number;
  readonly isNeedle: boolean;
}

function colourAt(x: number, y: number, scene: Scene): readonly number[] {
  if (scene.distance < scene.dialR) {
    if (scene.isNeedle) return [124, 31, 75];
    if (scene.distance > scene.dialR - 10) return [40, 48, 46];
    return [246, 244, 236];
  }
  const offset = Math.abs(y - scene.pipeY);
  if (offset < 28) return [214 - offset * 2, 125 - offset, 64 - offset / 2];
  const shade = x % scene.pitch < 3 ? 120 : 196;
  return [shade, shade + 6, shade + 4];
}

function onNeedle(dx: number, dy: number, angle: number, length: number): boolean {
  const along = dx * Math.cos(angle) + dy * Math.sin(angle);
  const across = Math.abs(-dx * Math.sin(angle) + dy * Math.cos(angle));
  return along > -12 && along < length * 0.8 && across < 4;
}

function clamp(value: number): number {
  return Math.max(0, Math.min(255, value));
}
