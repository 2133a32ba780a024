/** A rectangle on the page, px; the origin is the top left corner of the figure, y runs down. */
export interface Rectangle {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}
