import { longestPhoto } from "@/shared/contract/photoLimit";

/** Longest side of a kept photo in px. */
const longestSide = 640;
const qualities = [0.82, 0.7, 0.55, 0.4];
/** No camera makes larger ones; reading such a file would only stall the page. */
const largestFile = 40 * 2 ** 20;

/** The size a picture is kept in: as it is, or its longest side cut down. */
export function keptSize(width: number, height: number): { width: number; height: number } {
  const factor = Math.min(1, longestSide / Math.max(width, height));
  return { width: Math.max(1, Math.round(width * factor)), height: Math.max(1, Math.round(height * factor)) };
}

/** A photo of the device as a small JPEG in a data address; what is wrong in words where it cannot be used. */
export async function shrinkPhoto(file: Blob): Promise<{ photo: string } | { problem: string }> {
  if (file.size > largestFile) return { problem: "This file is larger than 40 MB. Choose a smaller photo." };
  try {
    const picture = await createImageBitmap(file);
    const { width, height } = keptSize(picture.width, picture.height);
    const canvas = document.createElement("canvas");
    canvas.width = width;
    canvas.height = height;
    const context = canvas.getContext("2d");
    if (!context) return { problem: "This browser cannot make the photo smaller. The instrument is safe without it." };
    // What is see-through would turn black.
    context.fillStyle = "#fff";
    context.fillRect(0, 0, width, height);
    context.drawImage(picture, 0, 0, width, height);
    picture.close();
    for (const quality of qualities) {
      const photo = canvas.toDataURL("image/jpeg", quality);
      if (photo.startsWith("data:image/jpeg") && photo.length <= longestPhoto) return { photo };
    }
    return { problem: "This photo stays too large. Try one with less in it." };
  } catch {
    return { problem: "This file is no picture that the browser can read. Choose a JPEG, PNG or WebP." };
  }
}
