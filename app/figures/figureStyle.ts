/** Colours of a figure, each as `#rrggbb`, and its type. */
export interface FigureStyle {
  readonly paper: string;
  readonly ink: string;
  readonly inkQuiet: string;
  readonly rule: string;
  readonly ruleStrong: string;
  readonly accent: string;
  /** One for each form of a proton system and more; neighbours differ in lightness as well as in hue. */
  readonly forms: readonly string[];
  /** Families in order of preference, as CSS has them. */
  readonly fontFamily: string;
}
