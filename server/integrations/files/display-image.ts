import sharp from 'sharp'
import { FileError } from './file-error.ts'

// Only the decoders of what we accept; SVG, PDF and the rest of the library's formats stay shut.
sharp.block({ operation: ['VipsForeignLoad'] })
sharp.unblock({ operation: ['VipsForeignLoadJpegBuffer', 'VipsForeignLoadPngBuffer', 'VipsForeignLoadTiffBuffer'] })
// Two cores serve everyone; a picture may wait.
sharp.concurrency(1)

/** 80 megapixels: a stitched micrograph fits, and decoded it stays below 250 MB. */
export const imageMaxPixels = 80_000_000
const displayMaxEdgePx = 2400

export type DisplayImage = {
  content: Buffer
  contentType: 'image/jpeg' | 'image/png'
  widthPx: number
  heightPx: number
  /** Size of the original after turning it upright; displayed by original width is the scale of anything measured on the picture. */
  originalWidthPx: number
  originalHeightPx: number
}

/**
 * A picture made anew for display from an original that is kept as it is: JPEG, or PNG from a PNG, upright, at most 2400 px long,
 * without metadata. Size is read from the header and refused there, before a pixel is decoded.
 * @throws FileError `bad-picture`
 */
export async function displayImage(original: Buffer, maxPixels = imageMaxPixels): Promise<DisplayImage> {
  const { format, width, height } = await readHeader(original, maxPixels)
  const asPng = format === 'png'
  const upright = sharp(original, { limitInputPixels: maxPixels, failOn: 'error', pages: 1 })
    .autoOrient()
    .resize({ width: displayMaxEdgePx, height: displayMaxEdgePx, fit: 'inside', withoutEnlargement: true })
    .toColourspace('srgb')
    .timeout({ seconds: 30 })
  const encoded = asPng ? upright.png({ compressionLevel: 8 }) : upright.flatten({ background: '#ffffff' }).jpeg({ quality: 88 })
  try {
    const { data, info } = await encoded.toBuffer({ resolveWithObject: true })
    return {
      content: data,
      contentType: asPng ? 'image/png' : 'image/jpeg',
      widthPx: info.width,
      heightPx: info.height,
      originalWidthPx: width,
      originalHeightPx: height,
    }
  } catch (error) {
    throw new FileError('bad-picture', 'the picture is damaged and cannot be read to its end', { cause: error })
  }
}

async function readHeader(original: Buffer, maxPixels: number) {
  try {
    const header = await sharp(original, { limitInputPixels: false }).metadata()
    const pixels = header.width * header.height
    if (pixels > maxPixels) {
      throw new FileError('bad-picture', `the picture has ${megapixels(pixels)} megapixels (${header.width} × ${header.height}), the limit is ${megapixels(maxPixels)}`)
    }
    return { format: header.format, width: header.autoOrient.width, height: header.autoOrient.height }
  } catch (error) {
    if (error instanceof FileError) throw error
    throw new FileError('bad-picture', 'this is no readable PNG, JPEG or TIFF picture', { cause: error })
  }
}

function megapixels(pixels: number): string {
  return (pixels / 1e6).toFixed(1)
}
