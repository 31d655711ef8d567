import { PHOTO_LIMITS } from '#shared/photos.ts';
import { formatNumber } from '#src/lib/format.ts';

const MIB = 1024 * 1024;
/** What the file picker offers; phones turn their own kind into JPEG when only these are asked for. */
export const PHOTO_KINDS = 'image/jpeg,image/png,image/webp';

/** Why a file need not be sent at all; undefined where only the server can tell. */
export function whyNotSent(file: Pick<File, 'name' | 'size' | 'type'>): string | undefined {
  if (file.size === 0) return 'The file is empty; choose it again, or take the photo anew';
  if (file.size > PHOTO_LIMITS.fileBytes) return `It weighs ${formatNumber(file.size / MIB, 1)} MiB; a photo may weigh at most ${PHOTO_LIMITS.fileBytes / MIB} MiB`;
  if (/image\/hei[cf]/.test(file.type) || /\.hei[cf]$/i.test(file.name)) return 'HEIC pictures cannot be read here. Send it as JPEG: on an iPhone, Settings, Camera, Formats, Most Compatible; or share the photo as JPEG';
  // Phones leave the type of some pictures empty: those are for the server to judge by their bytes.
  if (file.type !== '' && !PHOTO_KINDS.split(',').includes(file.type)) return 'This is not a photo; send a JPEG, PNG or WebP picture';
  return undefined;
}
