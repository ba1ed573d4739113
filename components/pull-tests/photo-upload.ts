/** Photos are made small in the browser; redrawing also leaves out where they were taken. */

export const MAX_PHOTO_BYTES = 5 * 1024 * 1024;
const LONGEST_SIDE_PX = 1600;
const JPEG_QUALITY = 0.82;

export interface ChosenPhoto {
  readonly content: Blob;
  readonly keepsPosition: boolean;
}

/** The photo upright, at most 1600 pixels long, as JPEG. */
export async function shrinkPhoto(file: Blob): Promise<Blob> {
  const picture = await createImageBitmap(file, { imageOrientation: "from-image" });
  const scale = Math.min(1, LONGEST_SIDE_PX / Math.max(picture.width, picture.height));
  const canvas = document.createElement("canvas");
  canvas.width = Math.max(1, Math.round(picture.width * scale));
  canvas.height = Math.max(1, Math.round(picture.height * scale));
  canvas.getContext("2d")?.drawImage(picture, 0, 0, canvas.width, canvas.height);
  picture.close();
  return new Promise((resolve, reject) => {
    canvas.toBlob((blob) => (blob ? resolve(blob) : reject(new Error("no picture"))), "image/jpeg", JPEG_QUALITY);
  });
}

/** Sends the photo of a reading; null when it is saved, else a sentence that says why not. */
export async function uploadPhoto(pullTestId: string, { content, keepsPosition }: ChosenPhoto): Promise<string | null> {
  try {
    const response = await fetch(`/api/pull-tests/${pullTestId}/photo${keepsPosition ? "?keepPosition=1" : ""}`, {
      method: "PUT",
      headers: { "Content-Type": "application/octet-stream" },
      body: content,
    });
    if (response.ok) return null;
    const answer = (await response.json()) as { error?: { message?: string } };
    return answer.error?.message ?? "The server did not take it.";
  } catch {
    return "No connection. Open the reading later and add it there.";
  }
}
