import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { encodePhoto } from './encode-photo.ts';

const limit = 50_000_000;

function picture(width: number, height: number) {
  return sharp({ create: { width, height, channels: 3, background: '#804020' } });
}

describe('a picture', () => {
  it('loses where and by what it was taken, and stands upright', async () => {
    const taken = await picture(40, 20)
      .withExif({
        IFD0: { Make: 'Phone', Orientation: '6' },
        IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '52/1 13/1 0/1' },
      })
      .withMetadata({ orientation: 6 })
      .jpeg()
      .toBuffer();
    expect((await sharp(taken).metadata()).exif).toBeDefined();
    const kept = await encodePhoto(taken, limit);
    expect(kept).toMatchObject({ width: 20, height: 40 });
    const { format, exif, xmp, iptc, icc, orientation } = await sharp(kept?.bytes).metadata();
    expect({ format, exif, xmp, iptc, icc, orientation }).toEqual({
      ...{ format: 'jpeg', exif: undefined, xmp: undefined, iptc: undefined, icc: undefined },
      orientation: undefined,
    });
    expect(kept?.bytes.includes('GPS')).toBe(false);
  });

  it('is at most 1600 px on its longest side, and never drawn larger', async () => {
    const large = await encodePhoto(await picture(4000, 1000).png().toBuffer(), limit);
    expect(large).toMatchObject({ width: 1600, height: 400 });
    const small = await encodePhoto(await picture(30, 10).webp().toBuffer(), limit);
    expect(small).toMatchObject({ width: 30, height: 10 });
  });

  it('that unfolds to too many pixels is refused, however small its file', async () => {
    const bomb = await picture(8000, 8000).png({ compressionLevel: 9 }).toBuffer();
    expect(bomb.length).toBeLessThan(1_000_000);
    expect(await encodePhoto(bomb, limit)).toBeNull();
  });

  it('is refused where it is none: words, a drawing, a half', async () => {
    expect(await encodePhoto(Buffer.from('no picture at all'), limit)).toBeNull();
    const drawing =
      '<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><rect width="9" height="9"/></svg>';
    expect(await encodePhoto(Buffer.from(drawing), limit)).toBeNull();
    const whole = await picture(400, 400).jpeg().toBuffer();
    expect(await encodePhoto(whole.subarray(0, whole.length / 3), limit)).toBeNull();
  });
});
