/**
 * Takes the colour out of a picture, each pixel as bright as before.
 * **Source**: luma weights of ITU-R BT.709.
 * @param pixels red, green, blue, opacity; changed in place
 */
export function turnGrey(pixels: Uint8ClampedArray): void {
  for (let i = 0; i < pixels.length; i += 4) {
    const luma =
      0.2126 * (pixels[i] as number) +
      0.7152 * (pixels[i + 1] as number) +
      0.0722 * (pixels[i + 2] as number);
    pixels[i] = luma;
    pixels[i + 1] = luma;
    pixels[i + 2] = luma;
  }
}
