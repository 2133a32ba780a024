import type { Dual } from './dual.ts';

/** A model of the NIST collection: parameters b1, b2 … and the predictors of one observation give the response. */
export type NistModel = (b: readonly Dual[], x: number, x2: number) => Dual;

const square = (value: Dual) => value.times(value);
const decay = (amplitude: Dual, rate: Dual, x: number) => amplitude.times(rate.times(-x).exp());
const peak = (height: Dual, centre: Dual, width: Dual, x: number) =>
  height.times(square(centre.minus(x).over(width)).times(-1).exp());
const wave = (cosine: Dual, sine: Dual, angle: Dual) => cosine.times(angle.cos()).plus(sine.times(angle.sin()));

const chwirut: NistModel = ([b1, b2, b3], x) => b1.times(-x).exp().over(b3.times(x).plus(b2));
const gauss: NistModel = ([b1, b2, b3, b4, b5, b6, b7, b8], x) =>
  decay(b1, b2, x)
    .plus(peak(b3, b4, b5, x))
    .plus(peak(b6, b7, b8, x));
const lanczos: NistModel = ([b1, b2, b3, b4, b5, b6], x) =>
  decay(b1, b2, x)
    .plus(decay(b3, b4, x))
    .plus(decay(b5, b6, x));
const cubicOverCubic: NistModel = ([b1, b2, b3, b4, b5, b6, b7], x) => {
  const above = b4.times(x).plus(b3).times(x).plus(b2).times(x).plus(b1);
  const below = b7.times(x).plus(b6).times(x).plus(b5).times(x).plus(1);
  return above.over(below);
};

/** The models of nist-strd.json by the name of the data set; Nelson's response is the logarithm of y. */
export const nistModels: Readonly<Record<string, NistModel>> = {
  Bennett5: ([b1, b2, b3], x) => b1.times(b2.plus(x).power(b3.power(-1).times(-1))),
  BoxBOD: ([b1, b2], x) => b1.minus(decay(b1, b2, x)),
  Chwirut1: chwirut,
  Chwirut2: chwirut,
  DanWood: ([b1, b2], x) => b1.times(b2.times(Math.log(x)).exp()),
  ENSO: ([b1, b2, b3, b4, b5, b6, b7, b8, b9], x) => {
    const turn = 2 * Math.PI * x;
    const year = b2.times(Math.cos(turn / 12)).plus(b3.times(Math.sin(turn / 12)));
    const cycle = (period: Dual) => period.power(-1).times(turn);
    return b1
      .plus(year)
      .plus(wave(b5, b6, cycle(b4)))
      .plus(wave(b8, b9, cycle(b7)));
  },
  Eckerle4: ([b1, b2, b3], x) => b1.over(b2).times(square(b3.minus(x).over(b2)).times(-0.5).exp()),
  Gauss1: gauss,
  Gauss2: gauss,
  Gauss3: gauss,
  Hahn1: cubicOverCubic,
  Kirby2: ([b1, b2, b3, b4, b5], x) => {
    const above = b3.times(x).plus(b2).times(x).plus(b1);
    return above.over(b5.times(x).plus(b4).times(x).plus(1));
  },
  Lanczos1: lanczos,
  Lanczos2: lanczos,
  Lanczos3: lanczos,
  MGH09: ([b1, b2, b3, b4], x) =>
    b1.times(b2.times(x).plus(x * x)).over(
      b3
        .times(x)
        .plus(b4)
        .plus(x * x),
    ),
  MGH10: ([b1, b2, b3], x) => b1.times(b2.over(b3.plus(x)).exp()),
  MGH17: ([b1, b2, b3, b4, b5], x) => b1.plus(decay(b2, b4, x)).plus(decay(b3, b5, x)),
  Misra1a: ([b1, b2], x) => b1.minus(decay(b1, b2, x)),
  Misra1b: ([b1, b2], x) => {
    const base = b2.times(x / 2).plus(1);
    return b1.minus(b1.over(square(base)));
  },
  Misra1c: ([b1, b2], x) =>
    b1.minus(
      b1.times(
        b2
          .times(2 * x)
          .plus(1)
          .power(-0.5),
      ),
    ),
  Misra1d: ([b1, b2], x) => b1.times(b2).times(x).over(b2.times(x).plus(1)),
  Nelson: ([b1, b2, b3], x1, x2) => b1.minus(decay(b2, b3, x2).times(x1)),
  Rat42: ([b1, b2, b3], x) => b1.over(b2.minus(b3.times(x)).exp().plus(1)),
  Rat43: ([b1, b2, b3, b4], x) => b1.over(b2.minus(b3.times(x)).exp().plus(1).power(b4.power(-1))),
  Roszman1: ([b1, b2, b3, b4], x) =>
    b1.minus(b2.times(x)).minus(
      b4
        .times(-1)
        .plus(x)
        .power(-1)
        .times(b3)
        .atan()
        .times(1 / Math.PI),
    ),
  Thurber: cubicOverCubic,
};
