import sharp from 'sharp';
import type { LoafPictureSpec } from './spec.ts';

/** Which turn of the upright picture gives the stored pixels of each orientation: degrees clockwise, mirrored first or not. */
const STORED: readonly (readonly [turn: number, isMirrored: boolean])[] = [[0, false], [0, true], [180, false], [180, true], [270, true], [270, false], [90, true], [90, false]];

/** JPEG as a phone writes it: time with its offset, camera, orientation, and sometimes where it was taken. */
export async function encode(pixels: Uint8Array, width: number, height: number, spec: LoafPictureSpec): Promise<Buffer> {
  const orientation = spec.orientation ?? 1;
  const [turn, isMirrored] = STORED[orientation - 1] ?? [0, false];
  let image = sharp(pixels, { raw: { width, height, channels: 3 } });
  if (turn !== 0 || isMirrored) {
    const turned = await image.rotate(turn).flop(isMirrored).raw().toBuffer({ resolveWithObject: true });
    image = sharp(turned.data, { raw: { width: turned.info.width, height: turned.info.height, channels: 3 } });
  }
  const taken = spec.takenAt.replaceAll('-', ':').replace('T', ' ');
  const make = spec.camera.split(' ')[0] ?? spec.camera;
  const exif = {
    IFD0: { Make: make, Model: spec.camera, DateTime: taken, Software: `${make} Camera 4.2` },
    IFD2: { DateTimeOriginal: taken, OffsetTimeOriginal: spec.offset, DateTimeDigitized: taken, OffsetTime: spec.offset },
    ...(spec.position && { IFD3: position(spec.position) }),
  };
  return image.jpeg({ quality: 84, chromaSubsampling: '4:2:0' }).withExif(exif).withMetadata({ orientation }).toBuffer();
}

function position({ latitude, longitude }: { latitude: number; longitude: number }): Record<string, string> {
  const parts = (degrees: number) => {
    const size = Math.abs(degrees), whole = Math.floor(size), minutes = Math.floor((size - whole) * 60);
    return `${whole}/1 ${minutes}/1 ${Math.round(((size - whole) * 60 - minutes) * 6000)}/100`;
  };
  return { GPSLatitudeRef: latitude < 0 ? 'S' : 'N', GPSLatitude: parts(latitude), GPSLongitudeRef: longitude < 0 ? 'W' : 'E', GPSLongitude: parts(longitude) };
}
