/**
 * Degrees of freedom that stand for infinitely many: a quantile differs from
 * its limit by about z(z² + 1)/4ν (Student's t; F and χ² are alike), a part in
 * 1e11 or less up to 10,000 degrees of freedom on the other side. With still
 * more, the incomplete beta function begins to lose digits.
 */
export const nearlyInfinite = 1e13;
