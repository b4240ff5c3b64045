/** Width and height in pixels. */
export interface Size {
  width: number;
  height: number;
}

/** A place in a picture in pixels, x to the right and y down, pixel centres at whole numbers. */
export interface PixelPoint {
  x: number;
  y: number;
}

/** Two graduations of known distance that can be picked in a picture. */
export interface ScaleBar {
  from: PixelPoint;
  to: PixelPoint;
  lengthMm: number;
}

/** Finished samples, interleaved by channel, 8 or 16 bit by the kind of array. */
export interface Picture extends Size {
  channels: 1 | 3;
  data: Uint8Array | Uint16Array;
}

/** A picture with the scale that is burnt into it. */
export interface ScaledPicture extends Picture {
  scaleBar: ScaleBar;
}

/** Samples in work: interleaved, 0 black to 1 white, not clipped. */
export interface Raster extends Size {
  channels: 1 | 3;
  data: Float32Array;
}

export function createRaster(size: Size, channels: 1 | 3): Raster {
  return {
    width: size.width,
    height: size.height,
    channels,
    data: new Float32Array(size.width * size.height * channels),
  };
}

/** White in the picture's own range: 255 or 65535. */
export function whiteOf(picture: Picture): number {
  return picture.data instanceof Uint16Array ? 65535 : 255;
}
