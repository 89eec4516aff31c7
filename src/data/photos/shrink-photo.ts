import { photoSize } from './photo-size';

export type ShrunkPhoto =
  | { readonly type: 'shrunk'; readonly canvas: HTMLCanvasElement; readonly bytes: ArrayBuffer }
  | { readonly type: 'unreadable'; readonly words: string };

const JPEG_QUALITY = 0.82;
const UNREADABLE: ShrunkPhoto = {
  type: 'unreadable',
  words: 'This file is no picture that the tablet can read. Nothing was kept: take another.',
};

/** Draws the picture anew, which leaves behind everything a camera writes into a file, its location above all. */
export async function shrinkPhoto(file: Blob): Promise<ShrunkPhoto> {
  const picture = await createImageBitmap(file).catch(() => null);
  if (picture === null) return UNREADABLE;
  const canvas = document.createElement('canvas');
  Object.assign(canvas, photoSize(picture));
  const drawing = canvas.getContext('2d');
  drawing?.drawImage(picture, 0, 0, canvas.width, canvas.height);
  picture.close();
  const blob = await new Promise<Blob | null>((resolve) => {
    canvas.toBlob(resolve, 'image/jpeg', JPEG_QUALITY);
  });
  if (drawing === null || blob === null) return UNREADABLE;
  return { type: 'shrunk', canvas, bytes: await blob.arrayBuffer() };
}
