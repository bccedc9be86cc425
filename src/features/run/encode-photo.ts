import { createHash } from 'node:crypto';
import sharp from 'sharp';

export interface EncodedPhoto {
  bytes: Buffer;
  sha256: string;
  width: number;
  height: number;
}

/** What phones send. Anything else that the library could read (drawings, documents) has no business here. */
const formats = new Set(['jpeg', 'png', 'webp', 'gif', 'heif']);
const longestSide = 1600;
const secondsAtMost = 15;

/**
 * Draws a picture anew: upright, at most 1600 px, as JPEG, and nothing else of it kept. Where it was taken, by which
 * device and when is not in it any more, nor anything that was hidden behind it.
 * @param pixelLimit how many pixels it may unfold to
 * @returns null for what is no picture, is broken, or unfolds to more pixels than are allowed
 */
export async function encodePhoto(bytes: Uint8Array, pixelLimit: number): Promise<EncodedPhoto | null> {
  const read = { limitInputPixels: pixelLimit, failOn: 'error', pages: 1 } as const;
  try {
    const { format } = await sharp(bytes, read).metadata();
    if (format === undefined || !formats.has(format)) return null;
    const { data, info } = await sharp(bytes, read)
      .timeout({ seconds: secondsAtMost })
      .rotate()
      .resize({ width: longestSide, height: longestSide, fit: 'inside', withoutEnlargement: true })
      .flatten({ background: '#ffffff' })
      .toColourspace('srgb')
      .jpeg({ quality: 80 })
      .toBuffer({ resolveWithObject: true });
    const sha256 = createHash('sha256').update(data).digest('hex');
    return { bytes: data, sha256, width: info.width, height: info.height };
  } catch {
    // The library has no error class of its own: whatever it cannot draw is no picture for us.
    return null;
  }
}
