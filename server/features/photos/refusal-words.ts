import { PHOTO_LIMITS } from '#shared/photos.ts';
import type { Decoded } from './decoders.ts';
import type { Rendered } from './render.ts';

const SEND = 'send a JPEG, PNG or WebP picture';

/** Why a photo is not kept, in words that say what to do. */
export function refusalInWords(refusal: Exclude<Decoded, Rendered>): string {
  switch (refusal.why) {
    case 'empty':
      return 'The file is empty; choose it again, or take the photo anew';
    case 'heic':
      return 'HEIC pictures cannot be read here. Send it as JPEG: on an iPhone, Settings, Camera, Formats, Most Compatible; or share the photo as JPEG';
    case 'not-readable':
      return `This is not a picture that can be read; ${SEND}`;
    case 'other-kind':
      return `This is a file of kind ${refusal.kind}, not a photo; ${SEND}`;
    case 'too-many-pixels':
      return `The picture has ${refusal.width} × ${refusal.height} pixels; at most ${PHOTO_LIMITS.pixels / 1_000_000} million can be taken`;
    case 'damaged':
      return 'The picture is damaged or did not arrive whole; send it again';
    case 'broke-off':
      return 'The picture could not be read in time; try again, or send a smaller copy';
  }
}
