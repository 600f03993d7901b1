import sharp, { type Sharp } from 'sharp';
import { refuseInput } from '#shared/domain/refusal';
import { isMovingPng, kindOf } from './photo-kind';

/** Longest edge of a photo as kept, and of its small one, in pixels. */
export const LONGEST_EDGE = 2560;
export const LONGEST_EDGE_SMALL = 480;
/** Pixels above which a picture is refused unread: more than any phone's sensor that fits into 10 MB, less than would fill the memory. */
const MOST_PIXELS = 64_000_000;

/** A photo made anew: the picture alone, without anything that was written beside it. */
export interface RemadePhoto {
  whole: Buffer;
  small: Buffer;
  width: number;
  height: number;
}

/**
 * Makes a photo anew from its pixels, upright, in sRGB, as JPEG: what was beside the pixels (place, device, time, thumbnails,
 * whatever hides behind the picture) is not carried over. Refuses what is no JPEG or PNG by its content.
 */
export async function remakePhoto(sent: Buffer): Promise<RemadePhoto> {
  const kind = kindOf(sent);
  if (!kind) throw refused('is neither a JPEG nor a PNG, whatever its name says');
  if (kind === 'png' && isMovingPng(sent)) throw refused('moves; send a photo that stands still');
  await refuseUnreadable(sent, kind);
  try {
    const upright = open(sent).autoOrient().flatten({ background: '#ffffff' });
    const { data: whole, info } = await jpeg(upright, LONGEST_EDGE);
    const { data: small } = await jpeg(open(whole), LONGEST_EDGE_SMALL);
    return { whole, small, width: info.width, height: info.height };
  } catch {
    throw refused('is damaged or cut short');
  }
}

/** From the header alone, so that a picture too large is never unfolded. */
async function refuseUnreadable(sent: Buffer, kind: string): Promise<void> {
  const { format, width, height } = await sharp(sent, { limitInputPixels: false })
    .metadata()
    .catch(() => {
      throw refused('is damaged or cut short');
    });
  if (format !== kind) throw refused('is neither a JPEG nor a PNG, whatever its name says');
  if (width * height > MOST_PIXELS) {
    throw refused(`has more than ${MOST_PIXELS / 1_000_000} million pixels; send it smaller`);
  }
}

function open(bytes: Buffer): Sharp {
  // Odd but harmless markers, as some phones write them, are no reason to refuse.
  return sharp(bytes, { failOn: 'error', limitInputPixels: MOST_PIXELS });
}

function jpeg(
  image: Sharp,
  longest: number,
): Promise<{ data: Buffer; info: { width: number; height: number } }> {
  return image
    .resize({ width: longest, height: longest, fit: 'inside', withoutEnlargement: true })
    .jpeg({ quality: 82 })
    .toBuffer({ resolveWithObject: true });
}

function refused(what: string): Error {
  return refuseInput([{ path: '', message: `the photo ${what}` }]);
}
