import exifr from 'exifr';

/** What is kept of a picture's EXIF. Position, maker notes and all the rest never leave the decoder. */
export interface TakenWith {
  /** Clock of the camera, `YYYY-MM-DDTHH:MM:SS`. */
  localTime: string | null;
  /** Minutes that clock was ahead of UTC, when the camera says so. */
  offsetMinutes: number | null;
  camera: string | null;
}

const KEPT = ['DateTimeOriginal', 'CreateDate', 'OffsetTimeOriginal', 'OffsetTime', 'Make', 'Model'];
const NOTHING: TakenWith = { localTime: null, offsetMinutes: null, camera: null };

/**
 * Time and camera out of an EXIF block.
 *
 * @param exif the block as libvips hands it out, with or without its `Exif` head
 */
export async function takenWith(exif: Buffer | undefined): Promise<TakenWith> {
  if (!exif) return NOTHING;
  const tiff = exif.subarray(0, 4).toString('latin1') === 'Exif' ? exif.subarray(6) : exif;
  // A broken block costs its facts, not the picture.
  const tags = (await exifr.parse(tiff, { pick: KEPT, reviveValues: false, gps: false, mergeOutput: true }).catch(() => undefined)) as Record<string, unknown> | undefined;
  if (!tags) return NOTHING;
  return {
    localTime: localTimeOf(tags['DateTimeOriginal'] ?? tags['CreateDate']),
    offsetMinutes: offsetOf(tags['OffsetTimeOriginal'] ?? tags['OffsetTime']),
    camera: cameraOf(tags['Make'], tags['Model']),
  };
}

function localTimeOf(value: unknown): string | null {
  const match = typeof value === 'string' ? /^(\d{4})[:-](\d\d)[:-](\d\d)[ T](\d\d):(\d\d):(\d\d)/.exec(value) : null;
  if (!match) return null;
  const [, year, month, day, hour, minute, second] = match;
  const text = `${year}-${month}-${day}T${hour}:${minute}:${second}`;
  const instant = new Date(`${text}Z`);
  // A camera whose battery ran out says 0000 or 1970; days such as 31 February are no times either.
  return Number(year) >= 1990 && !Number.isNaN(instant.getTime()) && instant.toISOString().startsWith(text) ? text : null;
}

function offsetOf(value: unknown): number | null {
  const match = typeof value === 'string' ? /^([+-])(\d\d):(\d\d)/.exec(value.trim()) : null;
  if (!match) return value === 'Z' ? 0 : null;
  const minutes = Number(match[2]) * 60 + Number(match[3]);
  return minutes <= 14 * 60 ? (match[1] === '-' ? -minutes : minutes) : null;
}

/** Make and model as one line of plain text; the make is left out where the model begins with it. */
function cameraOf(make: unknown, model: unknown): string | null {
  const [maker, type] = [make, model].map((value) => (typeof value === 'string' ? plain(value) : ''));
  const name = type && maker && !type.toLowerCase().startsWith(maker.toLowerCase()) ? `${maker} ${type}` : type || maker;
  return name ? name.slice(0, 80) : null;
}

/** One line of text that PostgreSQL can hold and a person can read. */
export function plain(text: string): string {
  return text.toWellFormed().replaceAll(/[\p{C}\s]+/gu, ' ').trim();
}
