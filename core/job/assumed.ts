/** A default that was used because the job gives no value. Listed in the assessment, so that a report can say so. */
export interface Assumed {
  /** Field path from the scheme's root, as in `masonry.friction`. */
  readonly field: string;
  readonly value: number | string | null;
  /** One sentence: what was taken and on whose word. */
  readonly because: string;
}
