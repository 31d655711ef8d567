import sharp from 'sharp';

export const CORNERS = { topLeft: [200, 30, 30], topRight: [30, 170, 40], bottomLeft: [40, 60, 200], bottomRight: [235, 235, 235] } as const;

/** A PNG of 96 × 64 whose four quarters have four colours, so that no turn of it looks like another. */
export async function fourCorners(width = 96, height = 64): Promise<Buffer> {
  const quarter = (colour: readonly number[]) => ({ create: { width: width / 2, height: height / 2, channels: 3 as const, background: { r: colour[0] ?? 0, g: colour[1] ?? 0, b: colour[2] ?? 0 } } });
  return sharp({ create: { width, height, channels: 3, background: '#000' } })
    .composite([
      { input: quarter(CORNERS.topLeft), left: 0, top: 0 }, { input: quarter(CORNERS.topRight), left: width / 2, top: 0 },
      { input: quarter(CORNERS.bottomLeft), left: 0, top: height / 2 }, { input: quarter(CORNERS.bottomRight), left: width / 2, top: height / 2 },
    ])
    .png()
    .toBuffer();
}

/** The colours in the middle of the four quarters of a picture. */
export async function cornersOf(picture: Buffer): Promise<Record<keyof typeof CORNERS, number[]>> {
  const { data, info } = await sharp(picture).removeAlpha().raw().toBuffer({ resolveWithObject: true });
  const at = (x: number, y: number) => [...data.subarray((y * info.width + x) * 3, (y * info.width + x) * 3 + 3)];
  const [left, right, top, bottom] = [info.width >> 2, (info.width * 3) >> 2, info.height >> 2, (info.height * 3) >> 2];
  return { topLeft: at(left, top), topRight: at(right, top), bottomLeft: at(left, bottom), bottomRight: at(right, bottom) };
}
