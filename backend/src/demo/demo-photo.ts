import { Jimp, JimpMime } from 'jimp';

const WIDTH = 800;
const HEIGHT = 600;

/**
 * A drawn stand-in for a site photo: a coil's fins behind a pipe, and a dial. Demo data only, and plainly a drawing.
 *
 * @param random 0 to 1, repeatable
 * @returns a JPEG without metadata
 */
export async function drawDemoPhoto(random: () => number): Promise<Buffer> {
  const image = new Jimp({ width: WIDTH, height: HEIGHT, color: 0xd8dcd6ff });
  const pitch = 10 + Math.floor(random() * 10);
  const pipeY = 180 + Math.floor(random() * 260);
  const [dialX, dialY, dialR] = [260 + random() * 500, 380 + random() * 140, 130 + random() * 40];
  const needle = random() * Math.PI * 1.5 + Math.PI * 0.75;
  image.scan((x, y, index) => {
    const distance = Math.hypot(x - dialX, y - dialY);
    const colour = colourAt(x, y, { pitch, pipeY, distance, dialR, onNeedle: onNeedle(x - dialX, y - dialY, needle, dialR) });
    const grain = Math.floor(random() * 14) - 7;
    for (let channel = 0; channel < 3; channel += 1) {
      image.bitmap.data[index + channel] = Math.max(0, Math.min(255, (colour[channel] ?? 0) + grain));
    }
  });
  return image.getBuffer(JimpMime.jpeg, { quality: 80 });
}

interface Scene {
  readonly pitch: number;
  readonly pipeY: number;
  readonly distance: number;
  readonly dialR: number;
  readonly onNeedle: boolean;
}

function colourAt(x: number, y: number, scene: Scene): readonly number[] {
  if (scene.distance < scene.dialR) {
    if (scene.onNeedle) return [124, 31, 75];
    if (scene.distance > scene.dialR - 10) return [40, 48, 46];
    return [246, 244, 236];
  }
  const offset = Math.abs(y - scene.pipeY);
  if (offset < 34) return [154 + 60 - offset * 2, 95 + 30 - offset, 50 + 14 - offset / 2];
  const shade = x % scene.pitch < 3 ? 120 : 196;
  return [shade, shade + 6, shade + 4];
}

function onNeedle(dx: number, dy: number, angle: number, length: number): boolean {
  const along = dx * Math.cos(angle) + dy * Math.sin(angle);
  const across = Math.abs(-dx * Math.sin(angle) + dy * Math.cos(angle));
  return along > -12 && along < length * 0.8 && across < 4;
}
